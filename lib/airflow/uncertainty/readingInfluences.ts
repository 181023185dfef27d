import { AirflowInputError, requireWithin } from "../errors";
import type { Instrument, Readings } from "../types";
import { UNITS } from "../units/units";
import { weightedMean } from "../velocity/mean";
import type { BudgetInput, Influence } from "./budget";
import { RECTANGULAR } from "./rectangular";

const DEFAULT_ACCURACY_PERCENT = 2;
const DEFAULT_FLUCTUATION_PERCENT = 2;
/** In Pa or m/s. */
const ABSOLUTE_LIMITS = [0, 5_000] as const;
/** Mean of the readings in m/s, or of their roots in √Pa, that keeps a quotient finite where nothing moves; no instrument tells it from 0. */
const LEAST_MEAN = 1e-3;

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
  return absolute ? 100 * errorsOf(absoluteAccuracy(readings, absolute), readings, traverse.points).common : 0;
}

/** An absolute accuracy in Pa or m/s, as the readings are. */
function absoluteAccuracy({ kind, unit }: Readings, { value, unit: givenUnit }: NonNullable<NonNullable<Instrument["accuracy"]>["absolute"]>): number {
  const path = ["instrument", "accuracy", "absolute"];
  const units: Record<string, { factor: number }> = kind === "velocity" ? UNITS.velocity : UNITS.pressure;
  const factor = units[givenUnit]?.factor;
  if (factor === undefined) throw new AirflowInputError({ path, code: "accuracy_unit_differs", detail: `The readings are in ${unit}; their accuracy must be in a unit of the same quantity, not in ${givenUnit}.` });
  return requireWithin(value * factor, ABSOLUTE_LIMITS, { path, code: "accuracy_out_of_range", detail: "An absolute accuracy of 0 to 5 kPa or 5,000 m/s is taken. Check the unit." });
}

type Points = BudgetInput["traverse"]["points"];

/**
 * Relative error of the average velocity where each reading may be off by a size in Pa or m/s: by the same error at all
 * points, or by an independent one at each. To first order: V ∝ x for velocities, V ∝ √p for pressures.
 * A pressure below a quarter of the size counts as that quarter: there the first order gives √size, which is all that the error can add to √0.
 */
function errorsOf(size: number, { kind }: Readings, points: Points): { common: number; independent: number } {
  let sum = 0;
  let squares = 0;
  for (const { reading, weight } of points) {
    const change = weight * (kind === "velocity" || size === 0 ? size : size / (2 * Math.sqrt(Math.max(reading, size / 4))));
    sum += change;
    squares += change ** 2;
  }
  const weights = points.map(({ weight }) => weight);
  const mean = weightedMean(points.map(({ reading }) => (kind === "velocity" ? reading : Math.sqrt(reading))), weights);
  const whole = Math.max(mean, LEAST_MEAN) * weights.reduce((total, weight) => total + weight, 0);
  return { common: sum / whole, independent: Math.sqrt(squares) / whole };
}

/** Fluctuation of single readings: random and relative, so of n equal velocities the mean has 1/√n of it, of unequal ones a little more. */
export function fluctuationRow({ readings, traverse: { points, velocities, average }, options }: BudgetInput): Influence {
  const each = options.fluctuationPercent ?? DEFAULT_FLUCTUATION_PERCENT;
  const sensitivity = readings.kind === "velocity_pressure" ? 0.5 : 1;
  const parts = points.map(({ weight }, index) => weight * velocities[index]!);
  const share = average > 0 ? Math.hypot(...parts) / parts.reduce((total, part) => total + part, 0) : 0;
  return {
    name: "fluctuation",
    percent: sensitivity * each * share,
    origin: options.fluctuationPercent === undefined ? "default" : "given",
    detail: `Each reading fluctuates by ${each} %, independent at each of ${points.length} points`,
  };
}

/** Rounding of the readings as written: half a step each way, independent at each point. */
export function roundingRow({ readings, traverse, options }: BudgetInput): Influence {
  const step = options.resolution ?? writtenResolution(readings.lines);
  const { factor } = readings.kind === "velocity" ? UNITS.velocity[readings.unit] : UNITS.pressure[readings.unit];
  return {
    name: "rounding",
    percent: 100 * errorsOf((step / 2) * factor, readings, traverse.points).independent * RECTANGULAR,
    origin: options.resolution === undefined ? "default" : "given",
    detail: `Readings to the nearest ${step} ${readings.unit}, independent at each point`,
  };
}

/**
 * The step between readings as they were written: one in the last decimal place that any of them uses.
 * @param lines The readings.
 * @returns The step, in the unit of the readings.
 * @example writtenResolution([[0.061, 0.07]]) // 0.001
 */
export function writtenResolution(lines: readonly (readonly (number | null)[])[]): number {
  let places = 0;
  for (const line of lines) for (const reading of line) if (reading !== null) places = Math.max(places, decimalPlaces(reading));
  return 10 ** -places;
}

const MOST_PLACES = 12;
/** Below this the product with a power of ten is within half a unit of the whole number that was written, so that it rounds to it. */
const LARGEST_SURE = 2 ** 51;
const POWERS = Array.from({ length: MOST_PLACES }, (_, places) => 10 ** places);

/**
 * Places after the decimal point of a number as it is written, at most 12. A number has so many or fewer where the nearest
 * decimal with so many is that very number: exact, because a quotient of two whole numbers is rounded correctly.
 * The way over the number's digits as text takes ten times as long, and every reading of every traverse goes through here.
 */
function decimalPlaces(value: number): number {
  for (const [places, power] of POWERS.entries()) {
    const whole = Math.round(value * power);
    if (!(Math.abs(whole) < LARGEST_SURE)) return decimalPlacesOfText(value);
    if (whole / power === value) return places;
  }
  return MOST_PLACES;
}

function decimalPlacesOfText(value: number): number {
  const [mantissa = "", exponent = "0"] = String(value).split("e");
  return Math.min(MOST_PLACES, Math.max(0, (mantissa.split(".")[1]?.length ?? 0) - Number(exponent)));
}
