import { area } from "../duct/area";
import type { InsideDuct } from "../duct/insideDuct";
import { velocityFromPressure } from "../velocity/velocityFromPressure";
import type { Case } from "./case";
import { roundTo } from "./rounding";
import type { FigureName } from "./slip";

/**
 * The arithmetic of a traverse, reduced to what a slip can touch. A slip is a function from one worksheet to another;
 * because only sums are kept, changing one reading costs the same for five points as for a thousand.
 */
export interface Worksheet {
  /** Σ x, in the unit of the readings. */
  sumReadings: number;
  /** Σ V in m/s. */
  sumVelocities: number;
  /** Σ w x and Σ w V. */
  weightedReadings: number;
  weightedVelocities: number;
  /** Σ w, which with equal weights is the count that was divided by. */
  divisor: number;
  count: number;
  /** Factor on every velocity. */
  velocityScale: number;
  /** Step in m/s that each point's velocity was rounded to. */
  velocityStep: number | null;
  /** Steps, in SI, that average and area were rounded to before the next step. */
  averageStep: number | null;
  areaStep: number | null;
  /** The velocity of the mean pressure was used for the mean of the velocities. */
  pressuresAveraged: boolean;
  inside: InsideDuct | null;
  areaFactor: number;
  /** From actual airflow to the one reported. */
  airflowFactor: number;
  /** Figures that are themselves supposed to be written down wrong. */
  miswritten: readonly FigureName[];
}

/** The worksheet without a slip. */
export function rightWorksheet(one: Case): Worksheet {
  const { points, inside, air, standardDensity, basis } = one;
  const sheet: Worksheet = {
    sumReadings: 0, sumVelocities: 0, weightedReadings: 0, weightedVelocities: 0, divisor: 0, count: points.length,
    velocityScale: 1, velocityStep: null, averageStep: null, areaStep: null, pressuresAveraged: false,
    inside, areaFactor: 1, airflowFactor: basis === "standard" ? air.density / standardDensity : 1, miswritten: [],
  };
  for (const { reading, velocity, weight } of points) {
    sheet.sumReadings += reading;
    sheet.sumVelocities += velocity;
    sheet.weightedReadings += weight * reading;
    sheet.weightedVelocities += weight * velocity;
    sheet.divisor += weight;
  }
  return sheet;
}

/** The velocity that a worksheet has for a point, from the right one. */
export const velocityOn = (sheet: Worksheet, velocity: number): number => roundTo(velocity * sheet.velocityScale, sheet.velocityStep);

/** Every velocity times a factor. */
export function withVelocitiesScaled(one: Case, sheet: Worksheet, factor: number, velocityStep = sheet.velocityStep): Worksheet {
  const changed = { ...sheet, velocityScale: sheet.velocityScale * factor, velocityStep, sumVelocities: 0, weightedVelocities: 0 };
  for (const { velocity, weight } of one.points) {
    const used = velocityOn(changed, velocity);
    changed.sumVelocities += used;
    changed.weightedVelocities += weight * used;
  }
  return changed;
}

/** One reading more, less or other: its effect on the sums. Velocities are those of the worksheet. */
export const withReading = (sheet: Worksheet, reading: number, velocity: number, weight: number, divisor = 0, count = 0): Worksheet => ({
  ...sheet,
  sumReadings: sheet.sumReadings + reading,
  sumVelocities: sheet.sumVelocities + velocity,
  weightedReadings: sheet.weightedReadings + weight * reading,
  weightedVelocities: sheet.weightedVelocities + weight * velocity,
  divisor: sheet.divisor + divisor,
  count: sheet.count + count,
});

/** In the unit of the total that was reported: of the readings, or m/s. */
export const totalOn = (one: Case, sheet: Worksheet): number => (one.totalOf === "readings" ? sheet.sumReadings : sheet.sumVelocities);

/** Average velocity in m/s. */
export function averageOn(one: Case, sheet: Worksheet): number {
  return sheet.pressuresAveraged ? velocityOfMeanPressure(one, sheet, (sheet.weightedReadings / sheet.divisor) * one.readingFactor) : sheet.weightedVelocities / sheet.divisor;
}

/** Velocity in m/s of a mean pressure in Pa, as a worksheet has it. */
export const velocityOfMeanPressure = (one: Case, sheet: Worksheet, pascals: number): number =>
  sheet.velocityScale * velocityFromPressure(pascals, one.air.density, one.coefficient);

/** Area in m²; null where there is neither a duct nor a given area. */
export const areaOn = (one: Case, sheet: Worksheet): number | null => (sheet.inside ? area(sheet.inside) * sheet.areaFactor : one.givenArea);

/** Airflow in m³/s, on the basis reported; null where there is no area. */
export function airflowOn(one: Case, sheet: Worksheet): number | null {
  const squareMetres = areaOn(one, sheet);
  return squareMetres === null ? null : squareMetres * averageOn(one, sheet) * sheet.airflowFactor;
}
