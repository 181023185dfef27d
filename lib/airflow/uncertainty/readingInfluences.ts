import { AirflowInputError, requireWithin } from "../errors";
import type { Instrument, Readings } from "../types";
import { UNITS } from "../units/units";
import { weightedMean } from "../velocity/mean";
import type { BudgetInput, Influence } from "./budget";

const RECTANGULAR = 1 / Math.sqrt(3);
const DEFAULT_ACCURACY_PERCENT = 2;
const DEFAULT_FLUCTUATION_PERCENT = 2;
/** In Pa or m/s. */
const ABSOLUTE_LIMITS = [0, 5_000] as const;
/** In Pa: no instrument tells a smaller pressure from nothing. */
const LEAST_PRESSURE = 1e-6;
/** In m/s, likewise. */
const LEAST_VELOCITY = 1e-3;

/**
 * Instrument accuracy, fully correlated over the points: a gain error moves all readings alike, an absolute error moves
 * the mean by its own size. From pressure to velocity a relative error halves: (1/2) Δp · mean(p^−½) / mean(p^½).
 */
export function instrumentRow(input: BudgetInput): Influence {
  const accuracy = input.instrument?.accuracy;
  const given = accuracy?.percentOfReading !== undefined || accuracy?.absolute !== undefined;
  const percentOfReading = given ? (accuracy.percentOfReading ?? 0) : DEFAULT_ACCURACY_PERCENT;
  const sensitivity = input.readings.kind === "velocity_pressure" ? 0.5 : 1;
  const relative = Math.hypot(sensitivity * percentOfReading, absolutePart(input)) * RECTANGULAR;
  return {
    name: "instrument",
    percent: relative,
    origin: given ? "given" : "default",
    detail: `Accuracy ${given ? "as given" : `± ${DEFAULT_ACCURACY_PERCENT} % of reading`}, rectangular distribution, the same at all points${sensitivity === 0.5 ? ", halved from pressure to velocity" : ""}`,
  };
}

/** Relative effect of an absolute accuracy on the average, in percent, before the distribution is taken into account. */
function absolutePart({ instrument, readings, traverse }: BudgetInput): number {
  const absolute = instrument?.accuracy?.absolute;
  return absolute ? 100 * absoluteAccuracy(readings, absolute) * offsetSensitivity(readings, traverse.points) : 0;
}

/** An absolute accuracy in Pa or m/s, as the readings are. */
function absoluteAccuracy({ kind, unit }: Readings, { value, unit: givenUnit }: NonNullable<NonNullable<Instrument["accuracy"]>["absolute"]>): number {
  const path = ["instrument", "accuracy", "absolute"];
  const units: Record<string, { factor: number }> = kind === "velocity" ? UNITS.velocity : UNITS.pressure;
  const factor = units[givenUnit]?.factor;
  if (factor === undefined) throw new AirflowInputError({ path, code: "accuracy_unit_differs", detail: `The readings are in ${unit}; their accuracy must be in a unit of the same quantity, not in ${givenUnit}.` });
  return requireWithin(value * factor, ABSOLUTE_LIMITS, { path, code: "accuracy_out_of_range", detail: "An absolute accuracy of 0 to 5 kPa or 5,000 m/s is taken. Check the unit." });
}

/** Relative change of the average velocity for a common shift of all readings, per Pa or m/s. */
function offsetSensitivity(readings: Readings, points: BudgetInput["traverse"]["points"]): number {
  const weights = points.map(({ weight }) => weight);
  const values = points.map(({ reading }) => reading);
  if (readings.kind === "velocity") {
    const mean = weightedMean(values, weights);
    return mean > LEAST_VELOCITY ? 1 / mean : 0;
  }
  // A reading of nothing has no derivative; it is left out of the sum, as a shift there is one-sided.
  const inverse = weightedMean(values.map((value) => (value > LEAST_PRESSURE ? 1 / Math.sqrt(value) : 0)), weights);
  const root = weightedMean(values.map(Math.sqrt), weights);
  return root > 0 ? inverse / (2 * root) : 0;
}

/** Fluctuation of single readings: random, so it falls with the square root of their number. */
export function fluctuationRow({ readings, traverse, options }: BudgetInput): Influence {
  const each = options.fluctuationPercent ?? DEFAULT_FLUCTUATION_PERCENT;
  const sensitivity = readings.kind === "velocity_pressure" ? 0.5 : 1;
  return {
    name: "fluctuation",
    percent: (sensitivity * each) / Math.sqrt(traverse.points.length),
    origin: options.fluctuationPercent === undefined ? "default" : "given",
    detail: `Each reading fluctuates by ${each} %, over √${traverse.points.length}`,
  };
}

/** Rounding of the readings as written: half a step each way, independent at each point. */
export function roundingRow({ readings, traverse, options }: BudgetInput): Influence {
  const step = options.resolution ?? writtenResolution(readings.lines);
  const { factor } = readings.kind === "velocity" ? UNITS.velocity[readings.unit] : UNITS.pressure[readings.unit];
  const percent = 100 * (step / 2) * factor * RECTANGULAR * offsetSensitivity(readings, traverse.points);
  return {
    name: "rounding",
    percent: percent / Math.sqrt(traverse.points.length),
    origin: options.resolution === undefined ? "default" : "given",
    detail: `Readings to the nearest ${step} ${readings.unit}, independent at each point`,
  };
}

/** The step between readings as they were written: one in the last decimal place that any of them uses. */
export function writtenResolution(lines: readonly (readonly (number | null)[])[]): number {
  let places = 0;
  for (const line of lines) for (const reading of line) if (reading !== null) places = Math.max(places, decimalPlaces(reading));
  return 10 ** -places;
}

function decimalPlaces(value: number): number {
  if (Number.isInteger(value)) return 0;
  const [mantissa = "", exponent = "0"] = String(value).split("e");
  return Math.min(12, Math.max(0, (mantissa.split(".")[1]?.length ?? 0) - Number(exponent)));
}
