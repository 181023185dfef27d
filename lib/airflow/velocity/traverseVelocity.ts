import type { ResolvedAir } from "../air/resolveAir";
import { readPoints, type ReadPoint } from "../readings/readPoints";
import type { Instrument, NegativeReadings, Probe, Readings } from "../types";
import { weightedMean } from "./mean";
import { pointVelocities, probeCoefficient, velocityOfPressure, type PointVelocities } from "./pointVelocities";

/** The velocities of a traverse, in SI. */
export interface TraverseVelocity extends PointVelocities {
  points: ReadPoint[];
  skipped: number;
  instrument: Instrument | undefined;
  /** m/s. */
  average: number;
  /** What the velocity of the mean velocity pressure would have been, in m/s; null for velocity readings. */
  fromAveragePressure: number | null;
}

/**
 * From readings to the average velocity. Velocities are averaged, never pressures: the velocity of a mean pressure
 * overstates the flow wherever the profile is not flat.
 * @param readings As written.
 * @param air The air in the duct.
 * @param standardDensity Density in kg/m³ that an instrument assumed where it does not say.
 * @returns Velocities in m/s.
 * @throws {AirflowInputError} No reading, one out of range, or a probe or instrument that cannot be.
 * @see AMCA 203 (from memory): the mean of the roots, not the root of the mean.
 */
export function traverseVelocity(
  readings: Readings,
  air: ResolvedAir,
  standardDensity: number,
  { probe, instrument, negativeReadings }: { probe?: Probe; instrument?: Instrument; negativeReadings?: NegativeReadings },
): TraverseVelocity {
  const { points, skipped } = readPoints(readings, instrument, negativeReadings);
  const found = pointVelocities(readings, points, air, probe, instrument, standardDensity);
  const weights = points.map(({ weight }) => weight);
  const fromAveragePressure =
    readings.kind === "velocity_pressure"
      ? velocityOfPressure(weightedMean(points.map(({ reading }) => reading), weights), air, probeCoefficient(probe))
      : null;
  return { ...found, points, skipped, instrument, average: weightedMean(found.velocities, weights), fromAveragePressure };
}
