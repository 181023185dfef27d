import type { AirflowInput } from "@/lib/airflow/calculations/airflow";
import type { Face } from "@/lib/airflow/layout/line";
import type { Air, Duct, Instrument, LayoutRule } from "@/lib/airflow/types";
import type { UnitSystem } from "@/lib/airflow/units/units";

/** Everything a person writes on the Bench, as typed: a blank that is not filled in is an empty text. */
export interface BenchSheet {
  units: UnitSystem;
  shape: Duct["shape"];
  measured: Duct["measured"];
  width: string;
  height: string;
  diameter: string;
  major: string;
  minor: string;
  lining: string;
  layout: LayoutRule;
  enterFrom: Face;
  kind: "velocity_pressure" | "velocity";
  principle: "" | Instrument["principle"];
  dryBulb: string;
  humidity: string;
  altitude: string;
  ductStatic: string;
  design: string;
  tolerance: string;
  lines: string[][];
}

export type BenchField = Exclude<keyof BenchSheet, "lines">;

/** Units of the blanks, by system. */
export const BLANK_UNITS = {
  ip: { length: "in", temperature: "degF", altitude: "ft", pressure: "in_wg", velocity: "ft/min", airflow: "ft3/min" },
  si: { length: "mm", temperature: "degC", altitude: "m", pressure: "Pa", velocity: "m/s", airflow: "L/s" },
} as const;

export const SHAPE_BLANKS: Record<Duct["shape"], { field: BenchField; label: string }[]> = {
  rectangular: [{ field: "width", label: "Width" }, { field: "height", label: "Height" }],
  round: [{ field: "diameter", label: "Diameter" }],
  flat_oval: [{ field: "major", label: "Longer axis" }, { field: "minor", label: "Shorter axis" }],
};

export const LAYOUTS: Record<Duct["shape"], LayoutRule[]> = {
  rectangular: ["log_tchebycheff", "equal_area", "method_1"],
  round: ["log_linear", "equal_area", "method_1"],
  flat_oval: ["log_tchebycheff", "equal_area"],
};

/** An invented exhaust duct to begin with. */
export const BLANK_SHEET: BenchSheet = {
  units: "ip", shape: "round", measured: "inside", width: "24", height: "16", diameter: "14", major: "26", minor: "12", lining: "",
  layout: "log_linear", enterFrom: "top", kind: "velocity_pressure", principle: "", dryBulb: "", humidity: "", altitude: "", ductStatic: "", design: "", tolerance: "10",
  lines: [],
};

/** A number as written, with a point or a comma; null for an empty blank, NaN for what is no number. */
export function numberIn(text: string): number | null {
  const written = text.trim();
  return written === "" ? null : Number(written.replace(/^(-?\d+),(\d+)$/, "$1.$2"));
}

/** Fields that hold something that is no number. */
export const unreadable = (sheet: BenchSheet): BenchField[] =>
  (["width", "height", "diameter", "major", "minor", "lining", "dryBulb", "humidity", "altitude", "ductStatic", "design", "tolerance"] as const).filter((field) => Number.isNaN(numberIn(sheet[field])));

/** The duct; null while a dimension is missing or is no number. */
export function ductOf({ units, shape, measured, lining, ...sheet }: BenchSheet): Duct | null {
  const { length: unit } = BLANK_UNITS[units];
  const sizes = SHAPE_BLANKS[shape].map(({ field }) => [field, numberIn(sheet[field as keyof typeof sheet] as string)] as const);
  if (sizes.some(([, value]) => value === null || Number.isNaN(value))) return null;
  const thickness = numberIn(lining);
  return {
    shape, measured,
    ...Object.fromEntries(sizes.map(([field, value]) => [field, { value, unit }])),
    ...(thickness ? { wall: { lining: { value: thickness, unit } } } : {}),
  } as unknown as Duct;
}

function airOf({ units, ...sheet }: BenchSheet): Air | undefined {
  const { temperature, altitude: altitudeUnit, pressure } = BLANK_UNITS[units];
  const [dryBulb, humidity, altitude, ductStatic] = [numberIn(sheet.dryBulb), numberIn(sheet.humidity), numberIn(sheet.altitude), numberIn(sheet.ductStatic)];
  if (dryBulb === null || [dryBulb, humidity, altitude, ductStatic].some(Number.isNaN)) return undefined;
  return {
    dryBulb: { value: dryBulb, unit: temperature },
    ...(humidity !== null && { relativeHumidity: { value: humidity, unit: "percent" as const } }),
    ...(altitude !== null && { altitude: { value: altitude, unit: altitudeUnit } }),
    ...(ductStatic !== null && { ductStaticPressure: { value: ductStatic, unit: pressure } }),
  };
}

/** The request that the sheet stands for; null while the duct is incomplete or nothing was read. */
export function requestOf(sheet: BenchSheet): AirflowInput | null {
  const duct = ductOf(sheet);
  const lines = sheet.lines.map((line) => line.map(numberIn));
  if (!duct || lines.length === 0 || lines.flat().some(Number.isNaN) || lines.flat().every((reading) => reading === null)) return null;
  const { pressure, velocity, airflow } = BLANK_UNITS[sheet.units];
  const air = airOf(sheet);
  const [design, tolerance] = [numberIn(sheet.design), numberIn(sheet.tolerance)];
  return {
    duct,
    layout: sheet.layout,
    readings: sheet.kind === "velocity" ? { kind: "velocity", unit: velocity, lines } : { kind: "velocity_pressure", unit: pressure, lines },
    ...(air && { air }),
    ...(sheet.principle && { instrument: { principle: sheet.principle } }),
    ...(design && { design: { airflow: { value: design, unit: airflow }, ...(tolerance !== null && !Number.isNaN(tolerance) && { tolerancePercent: tolerance }) } }),
    units: sheet.units,
    working: true,
  };
}

/** The sheet as the fragment of an address: nothing of it is sent or stored anywhere. */
export const fragmentOf = (sheet: BenchSheet): string => `#${toBase64Url(JSON.stringify(sheet))}`;

/** The sheet that a fragment carries; null for anything else. */
export function sheetFrom(fragment: string): BenchSheet | null {
  try {
    const given = JSON.parse(fromBase64Url(fragment.replace(/^#/, ""))) as Partial<BenchSheet>;
    const known = Object.fromEntries(Object.entries(BLANK_SHEET).map(([name, usual]) => [name, typeof given[name as keyof BenchSheet] === typeof usual ? given[name as keyof BenchSheet] : usual])) as unknown as BenchSheet;
    const areTexts = Array.isArray(known.lines) && known.lines.every((line) => Array.isArray(line) && line.every((text) => typeof text === "string"));
    const isKnown = known.shape in SHAPE_BLANKS && known.units in BLANK_UNITS && LAYOUTS[known.shape].includes(known.layout);
    return areTexts && isKnown ? known : null;
  } catch {
    return null;
  }
}

const toBase64Url = (text: string): string => btoa(String.fromCharCode(...new TextEncoder().encode(text))).replaceAll("+", "-").replaceAll("/", "_").replace(/=+$/, "");
const fromBase64Url = (text: string): string => new TextDecoder().decode(Uint8Array.from(atob(text.replaceAll("-", "+").replaceAll("_", "/")), (letter) => letter.charCodeAt(0)));

/** Rows of cells as a spreadsheet puts them on the clipboard. */
export const cellsOf = (clipboard: string): string[][] => clipboard.replace(/\r\n?/g, "\n").replace(/\n$/, "").split("\n").map((row) => row.split("\t").map((cell) => cell.trim()));
