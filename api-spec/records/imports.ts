import { z } from "zod";
import { check } from "../calculations/answers";
import { defineOperation } from "../define";
import { airflow } from "../quantities";
import { line, moment, orNull, page, pageQuery, projectId, recordId, traverseId } from "./common";
import { LINE_COLUMN, READING_COLUMNS, REFERENCE_COLUMN, TRAVERSE_COLUMNS, type ImportColumn } from "./importColumns";

const TAG = "Imports and exports";
const MIB = 1024 ** 2;

export const LARGEST_IMPORT = 5 * MIB;
export const MOST_ROWS = 5_000;
export const MOST_COLUMNS = 200;
export const LONGEST_CELL = 10_000;
export const MOST_FAULTS_TOLD = 1_000;

export const importId = recordId("imp", "an import");

const fault = z
  .strictObject({
    row: z.int().describe("As a spreadsheet numbers it: the first row is 1, blank rows count, and a cell of several lines is in one row."),
    column: z.string().nullable().describe("Its heading; null for the row as a whole."),
    code: z.string().describe("Stable code in snake_case."),
    detail: z.string().describe("What is wrong and what to do."),
  })
  .meta({ id: "ImportFault", description: "Something in a file that cannot be imported." });

const imported = z
  .strictObject({
    row: z.int().describe("Its first row."),
    reference: z.string().nullable().describe("What the file calls it in the column `traverse`."),
    id: traverseId.nullable().describe("The draft made of it; null in a dry run."),
    system: z.string().nullable(),
    location: z.string().nullable(),
    readings: z.int().describe("Points that were read."),
    airflow: orNull(airflow).describe("Actual airflow; null where there is no result, or a fault."),
    percentOfDesign: z.number().nullable(),
    verdict: z.enum(["within", "outside", "undecided"]).nullable(),
    failedChecks: z.array(check.pick({ code: true, severity: true, detail: true })),
  })
  .meta({ id: "ImportedTraverse", description: "A traverse of a file, with what it comes to." });

export const importAnswer = z
  .strictObject({
    id: importId.nullable().describe("Null in a dry run."),
    mode: z.enum(["dry_run", "commit"]),
    repeated: z.boolean().describe("Whether this very file was committed before, so that nothing new was made: the traverses are those of then."),
    name: z.string().nullable(),
    form: z.enum(["row_per_traverse", "row_per_reading"]).describe("Which of the two forms the headings are those of."),
    delimiter: z.enum(["comma", "semicolon", "tab"]).describe("What was found between the cells."),
    rows: z.int().describe("Rows read, without the headings and blank rows."),
    traverses: z.array(imported),
    faults: z.array(fault).describe(`Everything at fault, by row; at most ${MOST_FAULTS_TOLD.toLocaleString("en")} are listed.`),
    faultCount: z.int(),
    createdAt: moment.nullable().describe("Null in a dry run."),
  })
  .meta({ id: "Import", description: "What a file has in it, and what was made of it." });

const importSummary = z
  .strictObject({ id: importId, name: z.string().nullable(), rows: z.int(), traverses: z.int().describe("Drafts that were made."), createdAt: moment })
  .meta({ id: "ImportSummary", description: "An import in a list." });

export const importOptions = z.strictObject({
  mode: z.enum(["dry_run", "commit"]).default("dry_run").describe("`dry_run` checks and changes nothing; `commit` makes the drafts, all or none."),
  projectId: projectId.optional().describe("For rows that name no project."),
  decimalComma: z.stringbool({ truthy: ["true"], falsy: ["false"] }).default(false).describe("Whether the numbers are written with a decimal comma."),
  name: line(200).optional().describe("A name to know the import by, such as the file's."),
});

const table = (columns: readonly ImportColumn[]): string => ["| column | |", "| --- | --- |", ...columns.map(({ name, words }) => `| \`${name}\` | ${words} |`)].join("\n");

export const createImport = defineOperation({
  id: "createImport", method: "post", path: "/imports", tag: TAG, scope: "records:write",
  summary: "Import traverses from a CSV file",
  description: `Send the file as \`text/csv\` (RFC 4180, UTF-8, or UTF-16 with a byte order mark), up to ${LARGEST_IMPORT / MIB} MiB, ${MOST_ROWS.toLocaleString("en")} rows and ${MOST_COLUMNS} columns. The first row has the headings. Comma, semicolon or tab between the cells is found from it; blank rows and empty columns at the end are passed over; text that looks like a formula stays text.

A dry run (the default) answers with every row and column at fault and with what each traverse comes to. \`mode=commit\` makes a draft of every traverse, or, where anything is at fault, none (422). The same file with the same options, committed again, makes nothing new as long as any of its traverses is there, with or without an \`Idempotency-Key\`.

There are two forms; \`examples/csv\` has a template of each. In both, these columns describe a traverse, and each may be left out:

${table([REFERENCE_COLUMN, ...TRAVERSE_COLUMNS])}

**One row a traverse**: its readings stand in columns of their lines.

${table([LINE_COLUMN])}

**One row a reading**: what describes the traverse stands in its first row, and may be left empty in its others.

${table(READING_COLUMNS)}`,
  query: importOptions,
  body: z.string().describe("The file."),
  bodyMedia: "text/csv",
  maxBodyBytes: LARGEST_IMPORT,
  answer: importAnswer,
  problems: ["import-has-faults"],
});

export const listImports = defineOperation({
  id: "listImports", method: "get", path: "/imports", tag: TAG, scope: "records:read",
  summary: "List imports",
  description: "What was committed in the key's environment, the latest first.",
  query: z.strictObject(pageQuery),
  answer: page(importSummary),
});

export const readImport = defineOperation({
  id: "readImport", method: "get", path: "/imports/{id}", tag: TAG, scope: "records:read",
  summary: "Read an import",
  description: "What an import made, as it was answered then. A draft may have been changed, issued or deleted since.",
  params: z.strictObject({ id: importId }),
  answer: importAnswer,
  problems: ["not-found"],
});
