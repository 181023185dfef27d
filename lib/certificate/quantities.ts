import { tape, tapeUnit } from "@/lib/airflow/figure/measures";
import { UNIT_SYMBOLS } from "@/lib/airflow/figure/writeReadings";
import { toSi } from "@/lib/airflow/units/convert";
import type { Quantity, QuantityOf, UnitSystem } from "@/lib/airflow/units/units";

const SYMBOLS: Readonly<Record<string, string>> = { ...UNIT_SYMBOLS, percent: "%", degF: "°F", degC: "°C", "1": "" };
const RAISED: Readonly<Record<string, string>> = { "2": "²", "3": "³" };

/** A unit as the trade writes it: "ft³/min". */
export const unitSymbol = (unit: string): string => SYMBOLS[unit] ?? unit.replace(/(?<=[a-z])[23]/g, (digit) => RAISED[digit]!);

const formats = new Map<string, Intl.NumberFormat>();

/** Formats are dear to make, and a certificate of 1,000 readings writes 2,000 numbers. */
function written(value: number, least: number, most: number): string {
  const key = `${least} ${most}`;
  let format = formats.get(key);
  if (!format) {
    format = new Intl.NumberFormat("en", { minimumFractionDigits: least, maximumFractionDigits: most });
    formats.set(key, format);
  }
  return format.format(value).replace("-", "−");
}

/** Beyond these, digits of a double say nothing. */
const MOST_DECIMALS = 12;

/** A number to so many significant digits, thousands separated, with a true minus sign. Digits before the point are never rounded away. */
export function digits(value: number, significant: number): string {
  if (value === 0) return "0";
  const decimals = Math.max(0, significant - 1 - Math.floor(Math.log10(Math.abs(value))));
  return written(value, 0, Math.min(decimals, MOST_DECIMALS));
}

/** A number with exactly so many decimals; no minus sign before nought. */
export function fixed(value: number, decimals: number): string {
  const words = written(value, decimals, decimals);
  return /[1-9]/.test(words) ? words : words.replace("−", "");
}

/** A number with its unit. */
export function quantity({ value, unit }: Quantity, significant = 4): string {
  const symbol = unitSymbol(unit);
  return symbol === "" ? digits(value, significant) : `${digits(value, significant)} ${symbol}`;
}

/** A length as it was given. */
export const asGiven = ({ value, unit }: Quantity): string => `${written(value, 0, MOST_DECIMALS)} ${unitSymbol(unit)}`;

/** Lengths that make up a size, in the unit a tape is read in. */
export const size = (lengths: readonly QuantityOf<"length">[], system: UnitSystem): string => `${lengths.map((length) => tape(toSi("length", length), system)).join(" × ")} ${tapeUnit(system)}`;

/** Decimals that show a value to three or four digits and its uncertainty no finer. */
export const airflowDecimals = (value: number): number => Math.max(0, 3 - Math.floor(Math.log10(Math.max(Math.abs(value), 1e-9))));

/** A day and a time in UTC, as records are kept. */
export const moment = (iso: string): string => `${iso.slice(0, 10)}, ${iso.slice(11, 16)} UTC`;
