import { resolveAir, type ResolvedAir } from "../air/resolveAir";
import { insideDuct, type InsideDuct } from "../duct/insideDuct";
import type { Air, Duct, Instrument, Probe, Readings } from "../types";
import { toSi } from "../units/convert";
import { ANSWER_UNITS, UNITS, type UnitSystem, type VelocityUnit } from "../units/units";
import { pointVelocities, probeCoefficient } from "../velocity/pointVelocities";
import { traverseVelocity, type TraverseVelocity } from "../velocity/traverseVelocity";
import { placesOf } from "./digitVariants";
import { reportedFigures, type Reported, type ReportedFigures, type TotalUnit } from "./reported";

/** What a reconciliation is given. */
export interface CaseInput {
  duct?: Duct;
  readings: Readings;
  air?: Air;
  probe?: Probe;
  instrument?: Instrument;
  reported: Reported;
}

/** One reading on the sheet. */
export interface CasePoint {
  line: number;
  point: number;
  written: number;
  /** With its calibration, never below 0, in the unit of the readings. */
  reading: number;
  /** m/s. */
  velocity: number;
  weight: number;
}

/** Everything known about the readings, the duct, the air and the report, before any slip is supposed. */
export interface Case {
  readings: Readings;
  /** SI value of one unit of the readings. */
  readingFactor: number;
  /** Decimal places that the readings are written with. */
  places: number;
  points: CasePoint[];
  /** Points in the lines, read or not. */
  pointsInAll: number;
  equalWeights: boolean;
  traverse: TraverseVelocity;
  duct: Duct | undefined;
  inside: InsideDuct | null;
  /** A reported area in m² that is taken as given, for want of a duct. */
  givenArea: number | null;
  air: ResolvedAir;
  /** kg/m³. */
  standardDensity: number;
  coefficient: number;
  system: UnitSystem;
  figures: ReportedFigures;
  totalOf: "readings" | "velocities";
  basis: "actual" | "standard";
  /** Unit that velocities were worked in. */
  velocityUnit: VelocityUnit;
  /** Whether a reading counts as something else than what is written. */
  isCalibrated: boolean;
  /** A reading as it counts: calibrated, never below 0, in the unit of the readings. */
  effective: (written: number) => number;
  /** Velocities in m/s of readings as they count. */
  velocitiesOf: (effective: readonly number[]) => number[];
}

/** @throws {AirflowInputError} Readings, duct or air that cannot be, or a report that cannot be compared with them. */
export function openCase(input: CaseInput, standardDensity: number, system: UnitSystem): Case {
  const { duct, readings, air: givenAir, probe, instrument, reported } = input;
  const air = resolveAir(givenAir, standardDensity);
  const traverse = traverseVelocity(readings, air, standardDensity, { probe, instrument });
  const readingFactor = readings.kind === "velocity" ? UNITS.velocity[readings.unit].factor : UNITS.pressure[readings.unit].factor;
  const { gain = 1, offset = 0 } = instrument?.calibration ?? {};
  const effective = (written: number): number => Math.max(0, gain * written + offset);
  const velocityUnit = workedVelocityUnit(reported, readings, system);
  const points = traverse.points.map(({ line, point, weight }, index): CasePoint => {
    const written = readings.lines[line - 1]![point - 1]!;
    return { line, point, written, reading: effective(written), velocity: traverse.velocities[index]!, weight };
  });
  const total = totalUnit(reported.total, readings, points, velocityUnit);
  return {
    readings, readingFactor, points, traverse, duct, air, standardDensity, system, velocityUnit, effective,
    isCalibrated: gain !== 1 || offset !== 0,
    places: placesOf(readings.lines),
    pointsInAll: points.length + traverse.skipped,
    equalWeights: readings.weights === undefined,
    inside: duct ? insideDuct(duct) : null,
    givenArea: !duct && reported.area ? toSi("area", reported.area) : null,
    coefficient: probeCoefficient(probe),
    figures: reportedFigures(reported, readings, duct, total),
    totalOf: total.unit === readings.unit ? "readings" : "velocities",
    basis: reported.basis ?? "actual",
    velocitiesOf: (readingsAsTheyCount) => {
      const variants = readingsAsTheyCount.map((reading) => ({ line: 0, point: 0, reading: reading * readingFactor, weight: 1, wasNegative: false }));
      return pointVelocities(readings, variants, air, probe, instrument, standardDensity).velocities;
    },
  };
}

function workedVelocityUnit({ average }: Reported, readings: Readings, system: UnitSystem): VelocityUnit {
  if (average && average.unit in UNITS.velocity) return average.unit as VelocityUnit;
  return readings.kind === "velocity" ? readings.unit : ANSWER_UNITS[system].velocity;
}

/** A total carries no unit. Of velocity pressures it is the sum of the pressures or of their velocities, whichever is nearer. */
function totalUnit(total: number | undefined, readings: Readings, points: CasePoint[], velocityUnit: VelocityUnit): TotalUnit {
  const asRead = { unit: readings.unit, factor: 1 };
  if (readings.kind === "velocity" || total === undefined) return asRead;
  const { factor } = UNITS.velocity[velocityUnit];
  const sumOfReadings = points.reduce((sum, { reading }) => sum + reading, 0);
  const sumOfVelocities = points.reduce((sum, { velocity }) => sum + velocity, 0) / factor;
  const distance = (sum: number): number => Math.abs(Math.log(total / sum));
  return distance(sumOfVelocities) < distance(sumOfReadings) ? { unit: velocityUnit, factor } : asRead;
}
