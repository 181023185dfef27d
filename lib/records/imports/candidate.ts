import { TRAVERSE_COLUMNS, type ImportColumn } from "@/api-spec/records/importColumns";
import { LONGEST_CELL } from "@/api-spec/records/imports";
import type { Path } from "@/lib/airflow/errors";
import type { ImportFault } from "./fault";
import { columnNamed, type Headings } from "./headings";
import { readCell } from "./readCell";
import type { FileRow } from "./readRows";

interface Place {
  row: number;
  column: string | null;
}

/** What a file says of one traverse, before anybody asked whether it can be. */
export interface Candidate {
  /** Its first row. */
  row: number;
  reference: string | null;
  /** The fields of the traverse as the API takes them. */
  fields: Record<string, unknown>;
  /** Which cell each of them came from, by its path. */
  cells: Map<string, Place>;
  /** Columns of its first row whose cell is filled, but cannot be read. */
  unread: Set<string>;
  faults: ImportFault[];
}

const keyOf = (path: Path): string => path.join("/");

export const cellAt = ({ cells }: FileRow, place: number | undefined): string => (place === undefined ? "" : (cells[place] ?? "").trim());

/** Begins a traverse with what its first row describes. */
export function candidateOf(row: FileRow, reference: string | null, headings: Headings, decimalComma: boolean): Candidate {
  const candidate: Candidate = { row: row.number, reference, fields: {}, cells: new Map(), unread: new Set(), faults: [] };
  for (const column of TRAVERSE_COLUMNS) {
    const cell = cellAt(row, headings.places.get(column.name));
    if (cell === "" || !column.at) continue;
    const value = valueOf(row, cell, column, headings, decimalComma);
    if ("value" in value) put(candidate, column.at, value.value, { row: row.number, column: column.name });
    else {
      candidate.unread.add(column.name);
      // Several quantities may lack the same unit.
      if (!candidate.faults.some(({ column: told }) => told === value.column)) candidate.faults.push({ row: row.number, ...value });
    }
  }
  return candidate;
}

/** Puts a value where it belongs in a traverse, and remembers the cell it came from. */
export function put(candidate: Candidate, path: Path, value: unknown, place: Place): void {
  let holder = candidate.fields;
  for (const part of path.slice(0, -1)) holder = (holder[part] ??= {}) as Record<string, unknown>;
  holder[path.at(-1)!] = value;
  remember(candidate, path, place);
}

export const remember = ({ cells }: Candidate, path: Path, place: Place): unknown => cells.set(keyOf(path), place);

type CellResult = { value: unknown } | { column: string; code: string; detail: string };

function valueOf(row: FileRow, cell: string, { name, cell: kind }: ImportColumn, headings: Headings, decimalComma: boolean): CellResult {
  if (cell.length > LONGEST_CELL) return { column: name, code: "cell_too_long", detail: `A cell has at most ${LONGEST_CELL.toLocaleString("en")} characters.` };
  const read = readCell(cell, kind, decimalComma);
  if ("code" in read) return { column: name, ...read };
  if (kind.is === "percent") return { value: { value: read.value, unit: "percent" } };
  if (kind.is !== "quantity") return read;
  const unitCell = cellAt(row, headings.places.get(kind.unit));
  if (unitCell === "") return { column: kind.unit, code: "unit_missing", detail: `The unit of ${name} is missing. Fill in the column ${kind.unit}.` };
  const unit = readCell(unitCell, columnNamed(kind.unit).cell, decimalComma);
  return "code" in unit ? { column: kind.unit, ...unit } : { value: { value: read.value, unit: unit.value } };
}

/** The cell that something at a path of the traverse came from; where nothing did, the one that it would have come from. */
export function faultAt(candidate: Candidate, path: Path, code: string, detail: string): ImportFault {
  for (let length = path.length; length > 0; length -= 1) {
    const place = candidate.cells.get(keyOf(path.slice(0, length)));
    if (place) return { ...place, code, detail: pointOf(path, length) + detail };
  }
  const key = keyOf(path);
  const within = (one: string, other: string): boolean => one === other || one.startsWith(`${other}/`);
  const columns = TRAVERSE_COLUMNS.filter(({ at }) => at && (within(key, keyOf(at)) || within(keyOf(at), key)));
  const column = columns.find(({ at }) => candidate.cells.has(keyOf(at!))) ?? columns[0];
  return { row: candidate.row, column: column?.name ?? null, code, detail };
}

/** Which reading of a line's cell is meant. */
const pointOf = (path: Path, length: number): string => (path[0] === "readings" && path[1] === "lines" && length === 3 && path.length > 3 ? `Point ${Number(path[3]) + 1}: ` : "");
