import { AirflowInputError, type InputFault } from "../errors";
import type { Instrument, NegativeReadings, Readings } from "../types";
import { UNITS } from "../units/units";

/** One point that was read, in SI: Pa or m/s, calibration applied. */
export interface ReadPoint {
  line: number;
  point: number;
  /** As the instrument showed it, after its calibration, never below 0. */
  reading: number;
  weight: number;
  wasNegative: boolean;
}

export interface ReadPoints {
  points: ReadPoint[];
  /** Places where nothing could be read. */
  skipped: number;
}

/** Beyond these no traverse is within the scope of ISO 3966 (Mach 0.25); a larger figure is a slip in the unit. */
const GREATEST = { velocity_pressure: 5_000, velocity: 100 } as const;
/** Weights further apart than this would leave nothing of the lighter points. */
const WEIGHT_LIMITS = [1e-6, 1e6] as const;
const GREATEST_WORDS = { velocity_pressure: "5 kPa (20 in wg)", velocity: "100 m/s (19,700 ft/min)" } as const;

/**
 * The points of a traverse that were read, in the order read.
 * @param readings As written.
 * @param instrument Its calibration applies to the readings first.
 * @param negative Whether a reading below zero counts as zero, and stays in the count, or is refused.
 * @returns Readings in Pa or m/s, and how many places had none.
 * @throws {AirflowInputError} No point was read; a reading is out of range; weights do not fit the readings.
 * @example readPoints({ kind: "velocity", unit: "m/s", lines: [[5, null]] }, undefined) // { points: [{ line: 1, point: 1, reading: 5, weight: 1, wasNegative: false }], skipped: 1 }
 * @see AMCA 203 (from memory): a negative velocity pressure counts as zero and stays in the count.
 */
export function readPoints(readings: Readings, instrument: Instrument | undefined, negative: NegativeReadings = "count_as_zero"): ReadPoints {
  const { factor } = readings.kind === "velocity" ? UNITS.velocity[readings.unit] : UNITS.pressure[readings.unit];
  const { gain = 1, offset = 0 } = instrument?.calibration ?? {};
  const greatest = GREATEST[readings.kind];
  requireWeights(readings);
  const points: ReadPoint[] = [];
  const faults: InputFault[] = [];
  let skipped = 0;
  for (let line = 0; line < readings.lines.length; line += 1) {
    const row = readings.lines[line]!;
    for (let point = 0; point < row.length; point += 1) {
      const written = row[point];
      if (written == null) {
        skipped += 1;
        continue;
      }
      const reading = (gain * written + offset) * factor;
      const weight = readings.weights ? readings.weights[line]![point]! : 1;
      if (!(Math.abs(reading) <= greatest)) faults.push(outOfRange(readings, line, point));
      else if (reading < 0 && negative === "reject") faults.push(rejectedNegative(line, point, written));
      points.push({ line: line + 1, point: point + 1, reading: Math.max(0, reading), weight, wasNegative: reading < 0 });
    }
  }
  const [first, ...rest] = faults;
  if (first) throw new AirflowInputError(first, ...rest);
  if (points.length === 0) {
    throw new AirflowInputError({ path: ["readings", "lines"], code: "no_readings", detail: "None of the points could be read, so there is nothing to average." });
  }
  return { points, skipped };
}

const outOfRange = ({ kind }: Readings, line: number, point: number): InputFault => ({
  path: ["readings", "lines", line, point],
  code: "reading_out_of_range",
  detail: `The reading is beyond ${GREATEST_WORDS[kind]}, where the equations do not hold. Check the unit and the decimal point.`,
});

const rejectedNegative = (line: number, point: number, written: number): InputFault => ({
  path: ["readings", "lines", line, point],
  code: "negative_reading",
  detail: `The reading is ${written}, and the request asked to reject readings below zero.`,
});

function requireWeights({ lines, weights }: Readings): void {
  if (!weights) return;
  const refuse = (path: (string | number)[], detail: string): never => {
    throw new AirflowInputError({ path: ["readings", "weights", ...path], code: "weights_do_not_fit", detail });
  };
  if (weights.length !== lines.length) refuse([], `There are ${lines.length} lines of readings and ${weights.length} of weights.`);
  for (const [line, row] of weights.entries()) {
    if (row.length !== lines[line]!.length) refuse([line], `Line ${line + 1} has ${lines[line]!.length} readings and ${row.length} weights.`);
    const bad = row.findIndex((weight) => !(weight >= WEIGHT_LIMITS[0] && weight <= WEIGHT_LIMITS[1]));
    if (bad >= 0) refuse([line, bad], "A weight is above 0: a millionth to a million is taken.");
  }
}
