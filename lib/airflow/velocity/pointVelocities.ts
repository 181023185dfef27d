import { AirflowInputError } from "../errors";
import type { ResolvedAir } from "../air/resolveAir";
import { knownDensity } from "../air/resolveAir";
import { STANDARD_ATMOSPHERE } from "../air/standardAtmosphere";
import type { ReadPoint } from "../readings/readPoints";
import type { Instrument, Probe, Readings } from "../types";
import { toSi } from "../units/convert";
import { indicationFactor } from "./indicatedVelocity";
import { appliedCompressibility, compressibilityFactor, velocityFromPressure } from "./velocityFromPressure";

const LEAST_COEFFICIENT = 0.5;
const GREATEST_COEFFICIENT = 1.5;

export interface PointVelocities {
  /** m/s, in the order of the points. */
  velocities: number[];
  /** What the readings were multiplied by for density; null for velocity pressures. */
  indicationFactor: number | null;
  /** The density in kg/m³ that the instrument assumed; null for velocity pressures, and where no instrument is described. */
  assumedDensity: number | null;
  /** The smallest compressibility factor found, applied or not; null for velocity readings. */
  leastCompressibility: number | null;
}

/**
 * Actual velocity at each point. From a velocity pressure by Bernoulli's equation, with the correction for
 * compressibility where it exceeds 0.05 %; from an indicated velocity by the instrument's principle.
 * @param readings What was read, for its kind.
 * @param points The readings in Pa or m/s.
 * @param air The air in the duct.
 * @param probe Its coefficient is 0.5 to 1.5; 1 where none is given.
 * @param instrument Its principle decides the correction of an indicated velocity; none where it is left out.
 * @param standardDensity Density in kg/m³ that an instrument assumed where it does not say.
 * @returns Velocities in m/s.
 * @throws {AirflowInputError} A coefficient or an assumed density that cannot be.
 */
export function pointVelocities(readings: Readings, points: ReadPoint[], air: ResolvedAir, probe: Probe | undefined, instrument: Instrument | undefined, standardDensity: number): PointVelocities {
  if (readings.kind === "velocity") {
    const assumed = instrument ? assumedDensity(instrument, standardDensity) : null;
    const factor = instrument && assumed !== null ? indicationFactor(instrument.principle, assumed, air.density) : 1;
    return { velocities: points.map(({ reading }) => reading * factor), indicationFactor: factor, assumedDensity: assumed, leastCompressibility: null };
  }
  const coefficient = probeCoefficient(probe);
  const greatest = points.reduce((most, { reading }) => Math.max(most, reading), 0);
  return {
    velocities: points.map(({ reading }) => velocityOfPressure(reading, air, coefficient)),
    indicationFactor: null,
    assumedDensity: null,
    leastCompressibility: compressibilityFactor(greatest, staticPressure(air)),
  };
}

/** Velocity in m/s from a velocity pressure in Pa, corrected for compressibility where that counts. */
export const velocityOfPressure = (velocityPressure: number, air: ResolvedAir, coefficient: number): number =>
  velocityFromPressure(velocityPressure, air.density, coefficient) * appliedCompressibility(velocityPressure, staticPressure(air));

/** Absolute pressure in Pa that compressibility is judged by; sea level where only the density of the air is known. */
export const staticPressure = ({ absolutePressure }: ResolvedAir): number => absolutePressure ?? STANDARD_ATMOSPHERE.seaLevelPressure;

/** The density in kg/m³ that an instrument assumed; standard air where it does not say. */
export const assumedDensity = (instrument: Instrument, standardDensity: number): number =>
  instrument.assumedDensity ? knownDensity(toSi("density", instrument.assumedDensity), ["instrument", "assumedDensity"]) : standardDensity;

/** The probe's coefficient, 1 where none is given. */
export function probeCoefficient(probe: Probe | undefined): number {
  const coefficient = probe?.coefficient ?? 1;
  if (coefficient >= LEAST_COEFFICIENT && coefficient <= GREATEST_COEFFICIENT) return coefficient;
  throw new AirflowInputError({ path: ["probe", "coefficient"], code: "coefficient_out_of_range", detail: "A probe coefficient of 0.5 to 1.5 is taken; a standard pitot-static probe has 0.99 to 1, an S-type about 0.84." });
}
