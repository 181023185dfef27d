import { READING_COLUMNS, REFERENCE_COLUMN, TRAVERSE_COLUMNS } from "@/api-spec/records/importColumns";
import { LONGEST_CELL } from "@/api-spec/records/imports";
import { MOST_POINTS } from "@/api-spec/calculations/shapes";
import { candidateOf, cellAt, put, remember, type Candidate } from "./candidate";
import { UnreadableFile, type ImportFault } from "./fault";
import { cellsWithoutHeading, lineColumn, readHeadings, type Form, type Headings } from "./headings";
import { readLine, readNumber } from "./readCell";
import { delimiterOf, readRows, type DelimiterName, type FileRow } from "./readRows";

/** What a file has in it. */
export interface FileContent {
  form: Form;
  delimiter: DelimiterName;
  rows: number;
  traverses: Candidate[];
  /** Of the file and its rows; those of a traverse are with it. */
  faults: ImportFault[];
}

/** Reads the traverses of a file in either form. Never throws for what is in it. */
export async function readTraverses(text: string, decimalComma: boolean): Promise<FileContent> {
  const delimiter = delimiterOf(text);
  const content: FileContent = { form: "row_per_traverse", delimiter, rows: 0, traverses: [], faults: [] };
  let headings: Headings | null = null;
  let headingCells: string[] = [];
  const groups = new Map<string, Group>();
  try {
    for await (const row of readRows(text, delimiter)) {
      if (!headings) {
        headings = readHeadings(row);
        headingCells = row.cells;
        content.form = headings.form;
        content.faults.push(...headings.faults);
        continue;
      }
      content.rows += 1;
      content.faults.push(...cellsWithoutHeading(row, headingCells));
      if (headings.form === "row_per_traverse") addTraverse(content, groups, row, headings, decimalComma);
      else addReading(content, groups, row, headings, decimalComma);
    }
  } catch (error) {
    if (!(error instanceof UnreadableFile)) throw error;
    content.faults.push(error.fault);
  }
  if (content.faults.length === 0 && content.rows === 0) content.faults.push({ row: 1, column: null, code: "no_rows", detail: headings ? "There is no row below the headings." : "The file is empty. Its first row has the headings." });
  for (const group of groups.values()) finishLines(group);
  return content;
}

/** A traverse with what is known of its readings so far. */
interface Group {
  candidate: Candidate;
  first: FileRow;
  /** By line and point, from 1. */
  readings: Map<number, Map<number, number | null>>;
}

/** A row that is a whole traverse. */
function addTraverse(content: FileContent, groups: Map<string, Group>, row: FileRow, headings: Headings, decimalComma: boolean): void {
  const reference = cellAt(row, headings.places.get(REFERENCE_COLUMN.name));
  const candidate = candidateOf(row, reference || null, headings, decimalComma);
  content.traverses.push(candidate);
  const before = reference && groups.get(reference);
  if (before) candidate.faults.push({ row: row.number, column: REFERENCE_COLUMN.name, code: "traverse_repeated", detail: `Row ${before.first.number} has a traverse of this name already. Give each its own.` });
  const group: Group = { candidate, first: row, readings: new Map() };
  groups.set(reference || `row ${row.number}`, group);
  for (const [line, place] of [...headings.lines].sort(([one], [other]) => one - other)) {
    const column = lineColumn(line);
    const cell = cellAt(row, place);
    if (cell === "") continue;
    const read = cell.length > LONGEST_CELL ? { code: "cell_too_long", detail: `A cell has at most ${LONGEST_CELL.toLocaleString("en")} characters.` } : readLine(cell, decimalComma);
    if ("code" in read) candidate.faults.push({ row: row.number, column, ...read });
    // A line that cannot be read is there nevertheless.
    const values = "code" in read ? [null] : read.values;
    group.readings.set(line, new Map(values.map((value, index) => [index + 1, value])));
    remember(candidate, ["readings", "lines", line - 1], { row: row.number, column });
  }
}

/** A row that is one reading of a traverse. */
function addReading(content: FileContent, groups: Map<string, Group>, row: FileRow, headings: Headings, decimalComma: boolean): void {
  const fault = (column: string, code: string, detail: string): number => content.faults.push({ row: row.number, column, code, detail });
  const reference = cellAt(row, headings.places.get(REFERENCE_COLUMN.name));
  if (reference === "") {
    fault(REFERENCE_COLUMN.name, "missing_cell", "Which traverse the reading belongs to is not said.");
    return;
  }
  let group = groups.get(reference);
  if (group) {
    for (const { name } of TRAVERSE_COLUMNS) {
      const [cell, first] = [row, group.first].map((one) => cellAt(one, headings.places.get(name)));
      if (cell !== "" && cell !== first) fault(name, "differs_from_first_row", `The traverse's first row, ${group.first.number}, has ${first ? `"${first.slice(0, 40)}"` : "nothing"} here. Write it there, and leave this cell empty or alike.`);
    }
  } else {
    group = { candidate: candidateOf(row, reference, headings, decimalComma), first: row, readings: new Map() };
    groups.set(reference, group);
    content.traverses.push(group.candidate);
  }
  const [line, point, cell] = READING_COLUMNS.map(({ name }) => cellAt(row, headings.places.get(name))) as [string, string, string];
  const place = { line: placeIn(line), point: placeIn(point) };
  if (!place.line) fault("line", line ? "not_a_count" : "missing_cell", `The number of the hole or line, 1 to ${MOST_POINTS}, is needed.`);
  if (!place.point) fault("point", point ? "not_a_count" : "missing_cell", `The number of the point on its line, 1 to ${MOST_POINTS}, is needed.`);
  const read = cell === "" ? { value: null } : readNumber(cell, decimalComma);
  if ("code" in read) fault("reading", read.code, read.detail);
  if (!place.line || !place.point) return;
  const points = group.readings.get(place.line) ?? new Map<number, number | null>();
  if (points.has(place.point)) fault("point", "point_repeated", `Line ${place.line} has a point ${place.point} already.`);
  points.set(place.point, "code" in read ? null : (read.value as number | null));
  group.readings.set(place.line, points);
  remember(group.candidate, ["readings", "lines", place.line - 1, place.point - 1], { row: row.number, column: "reading" });
}

const placeIn = (cell: string): number | null => (/^[1-9]\d{0,3}$/.test(cell) && Number(cell) <= MOST_POINTS ? Number(cell) : null);

/** Puts the readings in the order of lines and points; what is left out between them is a fault, since a row may have been forgotten. */
function finishLines({ candidate, readings }: Group): void {
  if (readings.size === 0) {
    delete candidate.fields["readings"];
    return;
  }
  const lines = inOrder(readings, (line) => candidate.faults.push({ row: candidate.row, column: lineColumn(line), code: "line_missing", detail: `Line ${line} has no readings, though a later line has. Lines are counted from 1 without a gap.` }));
  const values = lines.map(([line, points]) =>
    inOrder(points, (point) => candidate.faults.push({ row: candidate.row, column: "point", code: "point_missing", detail: `Line ${line} has no point ${point}, though it has a later one. For a point that could not be read, give a row with an empty reading.` })).map(([, value]) => value),
  );
  const first = [...candidate.cells].find(([path]) => path.startsWith("readings/lines/"))!;
  put(candidate, ["readings", "lines"], values, first[1]);
}

/** Entries by number, from 1; tells of each that is left out. */
function inOrder<Entry>(entries: Map<number, Entry>, onMissing: (number: number) => void): [number, Entry][] {
  const sorted = [...entries].sort(([one], [other]) => one - other);
  const last = sorted.at(-1)?.[0] ?? 0;
  if (last !== sorted.length) for (let number = 1; number < last; number += 1) if (!entries.has(number)) onMissing(number);
  return sorted;
}
