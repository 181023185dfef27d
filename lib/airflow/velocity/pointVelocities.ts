import { AirflowInputError } from "../errors";
import type { ResolvedAir } from "../air/resolveAir";
import { knownDensity } from "../air/resolveAir";
import type { ReadPoint } from "../readings/readPoints";
import type { Instrument, Probe, Readings } from "../types";
import { toSi } from "../units/convert";
import { indicationFactor } from "./indicatedVelocity";
import { COMPRESSIBILITY_THRESHOLD, compressibilityFactor, velocityFromPressure } from "./velocityFromPressure";

const SEA_LEVEL_PRESSURE = 101_325;
const LEAST_COEFFICIENT = 0.5;
const GREATEST_COEFFICIENT = 1.5;

export interface PointVelocities {
  /** m/s, in the order of the points. */
  velocities: number[];
  /** What the readings were multiplied by for density; null for velocity pressures. */
  indicationFactor: number | null;
  /** The smallest compressibility factor found, applied or not; null for velocity readings. */
  leastCompressibility: number | null;
}

/**
 * Actual velocity at each point. From a velocity pressure by Bernoulli's equation, with the correction for
 * compressibility where it exceeds 0.05 %; from an indicated velocity by the instrument's principle.
 * @param standardDensity Density in kg/m³ that an instrument assumed where it does not say.
 */
export function pointVelocities(readings: Readings, points: ReadPoint[], air: ResolvedAir, probe: Probe | undefined, instrument: Instrument | undefined, standardDensity: number): PointVelocities {
  if (readings.kind === "velocity") {
    const factor = velocityFactor(instrument, air.density, standardDensity);
    return { velocities: points.map(({ reading }) => reading * factor), indicationFactor: factor, leastCompressibility: null };
  }
  const coefficient = probeCoefficient(probe);
  const pressure = air.absolutePressure ?? SEA_LEVEL_PRESSURE;
  let least = 1;
  const velocities = points.map(({ reading }) => {
    const velocity = velocityFromPressure(reading, air.density, coefficient);
    const compressibility = compressibilityFactor(reading, pressure);
    least = Math.min(least, compressibility);
    return 1 - compressibility > COMPRESSIBILITY_THRESHOLD ? velocity * compressibility : velocity;
  });
  return { velocities, indicationFactor: null, leastCompressibility: least };
}

/** The factor on indicated velocities; 1 where no instrument is described. */
function velocityFactor(instrument: Instrument | undefined, density: number, standardDensity: number): number {
  if (!instrument) return 1;
  return indicationFactor(instrument.principle, assumedDensity(instrument, standardDensity), density);
}

/** The density in kg/m³ that an instrument assumed; standard air where it does not say. */
export const assumedDensity = (instrument: Instrument, standardDensity: number): number =>
  instrument.assumedDensity ? knownDensity(toSi("density", instrument.assumedDensity), ["instrument", "assumedDensity"]) : standardDensity;

/** The probe's coefficient, 1 where none is given. */
export function probeCoefficient(probe: Probe | undefined): number {
  const coefficient = probe?.coefficient ?? 1;
  if (coefficient >= LEAST_COEFFICIENT && coefficient <= GREATEST_COEFFICIENT) return coefficient;
  throw new AirflowInputError({ path: ["probe", "coefficient"], code: "coefficient_out_of_range", detail: "A probe coefficient of 0.5 to 1.5 is taken; a standard pitot-static probe has 0.99 to 1, an S-type about 0.84." });
}
