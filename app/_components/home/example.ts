import type { AirflowInput } from "@/lib/airflow/calculations/airflow";

export type SheetField = "width" | "height" | "lining" | "dryBulb" | "humidity" | "altitude" | "design";

/** What a visitor may change, as typed. */
export interface SheetEntries {
  fields: Record<SheetField, string>;
  /** Velocity pressures, in. w.g.: one inner list for each hole, from the near wall to the far one. */
  lines: string[][];
}

/** An invented supply main: 26 × 18 in outside, lined with 1 in, at 1,640 ft. */
export const EXAMPLE: SheetEntries = {
  fields: { width: "26", height: "18", lining: "1", dryBulb: "58", humidity: "85", altitude: "1640", design: "2600" },
  lines: [
    ["0.041", "0.052", "0.055", "0.050", "0.040"],
    ["0.050", "0.061", "0.064", "0.060", "0.048"],
    ["0.054", "0.063", "0.066", "0.062", "0.051"],
    ["0.052", "0.062", "0.064", "0.059", "0.049"],
    ["0.043", "0.053", "0.056", "0.051", "0.042"],
  ],
};

/** The reading that the demonstration of a slip writes with two digits swapped, counted from 0. */
export const SLIP = { line: 1, point: 1, written: "0.016" };

/** The number in a blank; null for an empty one, NaN for what is no number. */
export const numberIn = (text: string): number | null => (text.trim() === "" ? null : Number(text.trim()));

/** The request that the sheet stands for; null while a field is empty or a blank holds no number. */
export function airflowRequest({ fields, lines }: SheetEntries): AirflowInput | null {
  const entered = Object.entries(fields).map(([name, text]) => [name, numberIn(text) ?? Number.NaN] as const);
  const readings = lines.map((line) => line.map(numberIn));
  if (entered.some(([, value]) => Number.isNaN(value)) || readings.flat().some(Number.isNaN)) return null;
  const number = Object.fromEntries(entered) as Record<SheetField, number>;
  return {
    duct: {
      shape: "rectangular",
      measured: "outside",
      width: { value: number.width, unit: "in" },
      height: { value: number.height, unit: "in" },
      wall: { lining: { value: number.lining, unit: "in" } },
    },
    layout: "log_tchebycheff",
    readings: { kind: "velocity_pressure", unit: "in_wg", lines: readings },
    air: {
      dryBulb: { value: number.dryBulb, unit: "degF" },
      relativeHumidity: { value: number.humidity, unit: "percent" },
      altitude: { value: number.altitude, unit: "ft" },
    },
    design: { airflow: { value: number.design, unit: "ft3/min" } },
    working: true,
  };
}
