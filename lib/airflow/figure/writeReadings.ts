import type { ReadingModel } from "./readingModel";

/** Units as the trade writes them, by their names in requests. */
export const UNIT_SYMBOLS: Readonly<Record<string, string>> = { in_wg: "in. w.g.", "ft/min": "ft/min", "m/s": "m/s", Pa: "Pa", hPa: "hPa", kPa: "kPa", inHg: "in. Hg", mbar: "mbar", psi: "psi" };

const MOST_DECIMALS = 4;

/** Readings with as many decimals as the longest of them has, as on a sheet; null where there is none. */
export function writeReadings(readings: readonly (number | null)[]): (string | null)[] {
  const decimals = readings.reduce<number>((most, reading) => (reading === null ? most : Math.max(most, decimalsOf(reading))), 0);
  return readings.map((reading) => (reading === null ? null : reading.toFixed(Math.min(decimals, MOST_DECIMALS))));
}

const decimalsOf = (value: number): number => /\.(\d+)$/.exec(String(value))?.[1]?.length ?? 0;

/** A value to three significant digits, without an exponent. */
export const significant = (value: number): string => (Math.abs(value) >= 1000 ? Math.round(value).toLocaleString("en") : String(Number(value.toPrecision(3))));

/** A traverse in words, line by line, for those who do not see the drawing. */
export function readingWords({ readings, lines }: ReadingModel, words: readonly (string | null)[], unit: string | undefined): string {
  const all = readings.map((reading, index) => ({ ...reading, words: words[index] ?? "not read" }));
  const sentences = lines.map((_, index) => {
    const own = all.filter(({ line }) => line === index + 1);
    return `Line ${index + 1}: ${own.map((one) => `${one.words}${one.suspected ? " (looks like a slip)" : ""}`).join(", ")}.`;
  });
  return [`Readings${unit ? ` in ${UNIT_SYMBOLS[unit] ?? unit}` : ""}, from the hole inwards.`, ...sentences].join(" ");
}
