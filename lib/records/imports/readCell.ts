import { UNITS } from "@/lib/airflow/units/units";
import type { CellKind } from "@/api-spec/records/importColumns";

/** What a cell says, or what is wrong with it. */
export type CellValue = { value: unknown } | { code: string; detail: string };

const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d{1,3})?$/i;
const YES = new Set(["yes", "true", "y", "1"]);
const NO = new Set(["no", "false", "n", "0"]);

const wrong = (code: string, detail: string): CellValue => ({ code, detail });

/** A number as a spreadsheet writes it: with a minus sign of either kind, and a decimal comma where that was declared. */
export function readNumber(cell: string, decimalComma: boolean): CellValue {
  const plain = cell.replace("−", "-");
  const text = decimalComma ? plain.replace(",", ".") : plain;
  if (NUMBER.test(text) && Number.isFinite(Number(text)) && !(decimalComma && plain.includes("."))) return { value: Number(text) };
  if (decimalComma && /\d\.\d/.test(plain)) return wrong("not_a_number", `"${shown(cell)}" has a point, but the numbers were declared to have a decimal comma. Write 0,041 and no separator of thousands.`);
  if (!decimalComma && /\d,\d/.test(plain)) return wrong("not_a_number", `"${shown(cell)}" has a comma. If it is a decimal comma, send decimalComma=true; a separator of thousands has to go.`);
  return wrong("not_a_number", `"${shown(cell)}" is not a number. Write the number alone; its unit has a column of its own.`);
}

/** What a cell that is not empty says. */
export function readCell(cell: string, kind: CellKind, decimalComma: boolean): CellValue {
  switch (kind.is) {
    case "text":
      return { value: cell };
    case "number":
    case "quantity":
    case "percent":
      return readNumber(cell, decimalComma);
    case "count":
      return /^\d{1,6}$/.test(cell) ? { value: Number(cell) } : wrong("not_a_count", `"${shown(cell)}" is not a whole number.`);
    case "yes_or_no": {
      const said = cell.toLowerCase();
      return YES.has(said) ? { value: true } : NO.has(said) ? { value: false } : wrong("not_yes_or_no", `Write yes or no, not "${shown(cell)}".`);
    }
    case "choice":
      return oneOf(cell, kind.of, (text) => text.toLowerCase().replace(/[\s_-]+/g, "_"));
    case "unit":
      return oneOf(cell, kind.of.flatMap((quantity) => Object.keys(UNITS[quantity])), (text) => text.toLowerCase());
  }
}

function oneOf(cell: string, names: readonly string[], simplified: (text: string) => string): CellValue {
  const name = names.find((one) => simplified(one) === simplified(cell));
  return name === undefined ? wrong("not_known", `"${shown(cell)}" is not one of ${names.join(", ")}.`) : { value: name };
}

/** The readings of a line: numbers with spaces between them. */
export function readLine(cell: string, decimalComma: boolean): { values: (number | null)[] } | { code: string; detail: string } {
  const values: (number | null)[] = [];
  for (const [index, part] of cell.split(/\s+/).entries()) {
    if (/^[-–—]$/.test(part)) values.push(null);
    else {
      const read = readNumber(part, decimalComma);
      if ("code" in read) return { code: read.code, detail: `Point ${index + 1}: ${read.detail}` };
      values.push(read.value as number);
    }
  }
  return { values };
}

const shown = (cell: string): string => (cell.length > 40 ? `${cell.slice(0, 39)}…` : cell);
