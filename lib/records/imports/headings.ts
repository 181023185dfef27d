import { LINE_COLUMN, READING_COLUMNS, REFERENCE_COLUMN, TRAVERSE_COLUMNS, type ImportColumn } from "@/api-spec/records/importColumns";
import { MOST_POINTS } from "@/api-spec/calculations/shapes";
import type { ImportFault, ImportReport } from "./fault";
import type { FileRow } from "./readRows";

export type Form = ImportReport["form"];

/** Where in a row the cells of each column stand. */
export interface Headings {
  form: Form;
  /** By column name. */
  places: Map<string, number>;
  /** By line, from 1: what stands in its column. */
  lines: Map<number, number>;
  faults: ImportFault[];
}

const COLUMNS = new Map([REFERENCE_COLUMN, ...TRAVERSE_COLUMNS, ...READING_COLUMNS].map((column) => [column.name, column]));
const LINE = /^line_([1-9]\d{0,3})$/;

/** The heading as a column is named: `Duct shape ` is `duct_shape`. */
const nameOf = (heading: string): string => heading.trim().toLowerCase().replace(/[\s_-]+/g, "_");

export const lineColumn = (line: number): string => LINE_COLUMN.name.replace("1", String(line));

/** Finds the columns of a file from its first row. */
export function readHeadings({ number: row, cells }: FileRow): Headings {
  const headings: Headings = { form: "row_per_traverse", places: new Map(), lines: new Map(), faults: [] };
  const fault = (column: string | null, code: string, detail: string): number => headings.faults.push({ row, column, code, detail });
  for (const [place, cell] of cells.entries()) {
    const name = nameOf(cell);
    if (name === "") continue;
    const line = Number(LINE.exec(name)?.[1]);
    if (headings.places.has(name) || headings.lines.has(line)) fault(cell.trim(), "heading_repeated", "There are two columns of this name. Delete or rename one.");
    else if (line >= 1 && line <= MOST_POINTS) headings.lines.set(line, place);
    else if (COLUMNS.has(name)) headings.places.set(name, place);
    else fault(cell.trim(), "unknown_column", "There is no such column. Check its spelling, or delete the column.");
  }
  if (READING_COLUMNS.some(({ name }) => headings.places.has(name))) {
    headings.form = "row_per_reading";
    for (const { name } of [REFERENCE_COLUMN, ...READING_COLUMNS]) if (!headings.places.has(name)) fault(name, "column_missing", `A file with a row for each reading needs the column ${name}.`);
    for (const line of headings.lines.keys()) fault(lineColumn(line), "column_of_other_form", "This column belongs to files with a row for each traverse. Keep either it, or line, point and reading.");
  }
  return headings;
}

/** What a row has beyond the last heading. */
export function cellsWithoutHeading({ number: row, cells }: FileRow, headingCells: readonly string[]): ImportFault[] {
  const stray = cells.findIndex((cell, place) => cell.trim() !== "" && (headingCells[place] ?? "").trim() === "");
  if (stray < 0) return [];
  return [{ row, column: null, code: "cell_without_heading", detail: `The cell in column ${stray + 1} has no heading above it. Were the cells divided where they should be? A cell that has the delimiter in it belongs in quotation marks.` }];
}

export const columnNamed = (name: string): ImportColumn => COLUMNS.get(name)!;
