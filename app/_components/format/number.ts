/** Every figure that a page shows is written here: one locale, thousands separated, a true minus sign. */
const LOCALE = "en-GB";

export interface NumberStyle {
  /** Digits after the decimal point, exactly. */
  decimals?: number;
  /** Significant digits at most, where decimals are not given; 6 when neither is. */
  significant?: number;
}

/**
 * Writes a number: `1234.5` → "1,234.5".
 *
 * @param value - A finite number; anything else is written as an en dash.
 */
export function formatNumber(value: number | null | undefined, { decimals, significant = 6 }: NumberStyle = {}): string {
  if (value == null || !Number.isFinite(value)) return "–";
  const digits: Intl.NumberFormatOptions =
    decimals === undefined
      ? { maximumSignificantDigits: Math.max(significant, integerDigits(value)) }
      : { minimumFractionDigits: decimals, maximumFractionDigits: decimals };
  return new Intl.NumberFormat(LOCALE, { ...digits, signDisplay: "negative" }).format(value).replace("-", "−");
}

/** A count is never shortened by the limit on significant digits. */
const integerDigits = (value: number): number => Math.max(1, Math.trunc(Math.abs(value)).toString().length);

/** The symbol that people write for a unit, from the name it has in requests and answers. */
const UNIT_SYMBOLS: Record<string, string> = {
  in_wg: "in. w.g.",
  in2: "in²",
  ft2: "ft²",
  m2: "m²",
  degF: "°F",
  degC: "°C",
  "lb/ft3": "lb/ft³",
  "kg/m3": "kg/m³",
  "ft3/lb": "ft³/lb",
  "m3/kg": "m³/kg",
  "ft3/min": "ft³/min",
  "m3/s": "m³/s",
  "m3/h": "m³/h",
  percent: "%",
  // UCUM's name for a bare ratio.
  "1": "",
};

/** `ft3/min` → "ft³/min". A name without another symbol is its own. */
export const unitSymbol = (unit: string): string => UNIT_SYMBOLS[unit] ?? unit;

/** Writes a quantity with its unit: `{ value: 2600, unit: "ft3/min" }` → "2,600 ft³/min". The space does not break. */
export const formatQuantity = ({ value, unit }: { value: number; unit: string }, style?: NumberStyle): string =>
  `${formatNumber(value, style)}\u00a0${unitSymbol(unit)}`.trimEnd();

/** `0.123` → "12.3 %". */
export const formatShare = (share: number, decimals = 1): string => `${formatNumber(share * 100, { decimals })}\u00a0%`;

/** `1` → "1 key", `2` → "2 keys"; a plural that is not formed by adding s is given. */
export const formatCount = (count: number, noun: string, plural = `${noun}s`): string =>
  `${formatNumber(count)}\u00a0${count === 1 ? noun : plural}`;

/** `1536` → "1.5 KiB". */
export function formatBytes(bytes: number): string {
  const units = ["B", "KiB", "MiB", "GiB", "TiB"];
  const step = bytes < 1 ? 0 : Math.min(units.length - 1, Math.floor(Math.log2(bytes) / 10));
  return `${formatNumber(bytes / 1024 ** step, { decimals: step === 0 ? 0 : 1 })}\u00a0${units[step]}`;
}
