import { compressibilityFactor } from "../velocity/velocityFromPressure";
import type { Case, CasePoint } from "./case";
import type { ReportedFigure } from "./reported";
import { averageIsPressure, HAIR, isReproduced } from "./reproduce";
import { areaOn, averageOn, totalOn, velocityOfMeanPressure, velocityOn, type Worksheet } from "./worksheet";

/**
 * What the report asks of a change in one reading: that (sum + weight × change) / (divisor + change of the divisor) lies between
 * low and high, of readings in their unit or velocities in m/s. It is put on the one figure that tells most; what passes
 * is then worked out in full.
 */
export interface ReadingTarget {
  of: "readings" | "velocities";
  /** Whether it is the total, which knows no weights and no divisor. */
  total: boolean;
  sum: number;
  divisor: number;
  low: number;
  high: number;
}

export function fits({ of, total, sum, divisor, low, high }: ReadingTarget, reading: number, velocity: number, weight: number, divisorChange: number): boolean {
  const change = of === "readings" ? reading : velocity;
  const value = total ? sum + change : (sum + weight * change) / (divisor + divisorChange);
  return value >= low && value <= high;
}

/** The target that a report sets for single readings; null where no reading can be at fault, because the figure already fits. */
export function readingTarget(one: Case, sheet: Worksheet): ReadingTarget | null {
  const { total, average, airflow } = one.figures;
  if (total && !sheet.miswritten.includes("total")) return totalTarget(one, sheet, total);
  if (average && !sheet.miswritten.includes("average")) return averageTarget(one, sheet, average);
  return airflow && !sheet.miswritten.includes("airflow") ? airflowTarget(one, sheet, airflow) : null;
}

function totalTarget(one: Case, sheet: Worksheet, total: ReportedFigure): ReadingTarget | null {
  const sum = totalOn(one, sheet);
  if (isReproduced(sum / total.factor, total)) return null;
  const [low, high] = rangeOf(total);
  return { of: one.totalOf, total: true, sum, divisor: 1, low, high };
}

function averageTarget(one: Case, sheet: Worksheet, average: ReportedFigure): ReadingTarget | null {
  const isPressure = averageIsPressure(one);
  const now = isPressure ? (sheet.weightedReadings / sheet.divisor) * one.readingFactor : averageOn(one, sheet);
  if (isReproduced(now / average.factor, average)) return null;
  const [low, high] = rangeOf(average);
  if (isPressure) return { of: "readings", total: false, sum: sheet.weightedReadings, divisor: sheet.divisor, low: low / one.readingFactor, high: high / one.readingFactor };
  return velocityTarget(one, sheet, low, high);
}

function airflowTarget(one: Case, sheet: Worksheet, airflow: ReportedFigure): ReadingTarget {
  const areas = usableAreas(one, sheet);
  const [low, high] = rangeOf(airflow);
  const slack = (sheet.averageStep ?? 0) / 2;
  return velocityTarget(one, sheet, low / (Math.max(...areas) * sheet.airflowFactor) - slack, high / (Math.min(...areas) * sheet.airflowFactor) + slack);
}

/** A target for the average velocity, which may have been worked out from the mean pressure. */
function velocityTarget(one: Case, sheet: Worksheet, low: number, high: number): ReadingTarget {
  if (!sheet.pressuresAveraged) return { of: "velocities", total: false, sum: sheet.weightedVelocities, divisor: sheet.divisor, low, high };
  const meanPressure = (velocity: number): number => (velocity / velocityOfMeanPressure(one, sheet, 1)) ** 2 / one.readingFactor;
  return { of: "readings", total: false, sum: sheet.weightedReadings, divisor: sheet.divisor, low: meanPressure(low), high: meanPressure(high) };
}

/** What a reported figure leaves open, in SI. */
const rangeOf = ({ value, rounding, factor }: ReportedFigure): [number, number] => {
  const open = rounding + HAIR * Math.max(1, Math.abs(value));
  return [(value - open) * factor, (value + open) * factor];
};

/** Areas in m² that the airflow may have been worked out with. */
function usableAreas(one: Case, sheet: Worksheet): number[] {
  const worked = areaOn(one, sheet)!;
  const { area } = one.figures;
  const step = (sheet.areaStep ?? 0) / 2;
  const reported = area && (sheet.miswritten.includes("area") || isReproduced(worked / area.factor, area)) ? [area.value * area.factor] : [];
  return [worked - step, worked + step, ...reported];
}

/**
 * What a reading would have to count as to meet the target, by a range that is a little generous where velocities are
 * rounded or air is compressed. In the unit of the readings.
 */
export function neededReading(one: Case, sheet: Worksheet, target: ReadingTarget, { reading, velocity, weight }: CasePoint): [number, number] {
  const { total, sum, divisor } = target;
  const change = (bound: number): number => (total ? bound - sum : (bound * divisor - sum) / weight);
  const changes = [change(target.low), change(target.high)] as const;
  if (target.of === "readings") return [reading + changes[0], reading + changes[1]];
  const now = velocityOn(sheet, velocity);
  const slack = sheet.velocityStep ?? 0;
  return [readingAt(one, sheet, now + changes[0] - slack)[0], readingAt(one, sheet, now + changes[1] + slack)[1]];
}

/** Bounds of the reading, in its unit, that a velocity in m/s stands for. */
function readingAt(one: Case, sheet: Worksheet, velocity: number): [number, number] {
  const wanted = Math.max(0, velocity);
  if (one.readings.kind === "velocity") {
    const reading = wanted / (sheet.velocityScale * one.readingFactor * (one.traverse.indicationFactor ?? 1));
    return [reading * (1 - HAIR), reading * (1 + HAIR)];
  }
  const pascals = (wanted / velocityOfMeanPressure(one, sheet, 1)) ** 2;
  const least = compressibilityFactor(1.05 * pascals, one.air.absolutePressure ?? LEAST_PRESSURE);
  return [(pascals / one.readingFactor) * (1 - HAIR), (pascals / least ** 2 / one.readingFactor) * (1 + HAIR)];
}

const LEAST_PRESSURE = 50_000;
