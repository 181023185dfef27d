import { Readable } from "node:stream";
import { setImmediate } from "node:timers/promises";
import { CsvError, parse, type Info } from "csv-parse";
import { LONGEST_CELL, MOST_COLUMNS, MOST_ROWS } from "@/api-spec/records/imports";
import { UnreadableFile } from "./fault";

/** A row of a file: its number as a spreadsheet shows it, and its cells. */
export interface FileRow {
  number: number;
  cells: string[];
}

export const DELIMITERS = { comma: ",", semicolon: ";", tab: "\t" } as const;
export type DelimiterName = keyof typeof DELIMITERS;

const CHUNK = 8 * 1024;
/** Longer than any row that can be imported, and little enough to hold. */
const LONGEST_ROW = 20 * LONGEST_CELL;
/** Rows of nothing but delimiters, as spreadsheets put them where cells were once filled. */
const MOST_BLANK_ROWS = 20_000;

/** The delimiter that the row of headings has most of; headings have neither commas nor semicolons in them. */
export function delimiterOf(text: string): DelimiterName {
  const headings = /^[\s]*([^\r\n]*)/.exec(text)?.[1] ?? "";
  const counts = (Object.keys(DELIMITERS) as DelimiterName[]).map((name) => [name, headings.split(DELIMITERS[name]).length] as const);
  return counts.reduce((most, one) => (one[1] > most[1] ? one : most))[0];
}

/**
 * The rows of a file that are not blank, while it is parsed: neither a row nor the number of rows grows beyond what is taken.
 * @throws {UnreadableFile} Where it is no CSV, or larger than is taken.
 */
export async function* readRows(text: string, delimiter: DelimiterName): AsyncGenerator<FileRow> {
  let kept = 0;
  let blank = 0;
  const parser = parse({ delimiter: DELIMITERS[delimiter], record_delimiter: ["\r\n", "\n", "\r"], relax_column_count: true, skip_empty_lines: true, info: true, max_record_size: LONGEST_ROW });
  Readable.from(chunksOf(text)).pipe(parser);
  try {
    for await (const { record: cells, info } of parser as AsyncIterable<{ record: string[]; info: Info }>) {
      const number = info.records + info.empty_lines;
      if (cells.every((cell) => cell.trim() === "")) {
        blank += 1;
        if (blank > MOST_BLANK_ROWS) throw unreadable(number, "too_many_rows", `There are more than ${MOST_BLANK_ROWS.toLocaleString("en")} blank rows. Delete those below the data.`);
        continue;
      }
      kept += 1;
      if (kept > MOST_ROWS + 1) throw unreadable(number, "too_many_rows", `A file has at most ${MOST_ROWS.toLocaleString("en")} rows below its headings. Divide it.`);
      if (cells.length > MOST_COLUMNS && cells.slice(MOST_COLUMNS).some((cell) => cell !== "")) throw unreadable(number, "too_many_columns", `A row has at most ${MOST_COLUMNS} columns; this one has ${cells.length}.`);
      yield { number, cells };
    }
  } catch (error) {
    throw error instanceof CsvError ? notCsv(error) : error;
  }
}

/** The text in pieces, with a turn for others between them. */
async function* chunksOf(text: string): AsyncGenerator<string> {
  for (let at = 0; at < text.length; at += CHUNK) {
    yield text.slice(at, at + CHUNK);
    await setImmediate();
  }
}

const unreadable = (row: number, code: string, detail: string): UnreadableFile => new UnreadableFile({ row, column: null, code, detail });

function notCsv({ code, message, records, empty_lines }: CsvError): UnreadableFile {
  const row = Number(records) + Number(empty_lines) + 1;
  if (code === "CSV_QUOTE_NOT_CLOSED") return unreadable(row, "quote_not_closed", "A quoted cell begins in this row and does not end. Close it, and write a quotation mark inside a quoted cell twice.");
  if (code === "CSV_MAX_RECORD_SIZE") return unreadable(row, "row_too_long", `The row is longer than ${LONGEST_ROW.toLocaleString("en")} characters; perhaps a quotation mark is missing at the end of a cell.`);
  if (code === "CSV_INVALID_CLOSING_QUOTE" || code === "INVALID_OPENING_QUOTE") return unreadable(row, "quote_misplaced", 'A quotation mark stands inside a cell. Put such a cell in quotation marks and write the mark twice: "24"" main".');
  return unreadable(row, "not_csv", `The row cannot be read: ${message}.`);
}
