import type { ResolvedAir } from "../air/resolveAir";
import type { ReadPoint } from "../readings/readPoints";
import type { Instrument, Probe, Readings } from "../types";
import { inAnswerUnits } from "../units/convert";
import type { QuantityOf, UnitSystem } from "../units/units";
import { INDICATION_EQUATION } from "../velocity/indicatedVelocity";
import { standardDeviation } from "../velocity/mean";
import { probeCoefficient, staticPressure } from "../velocity/pointVelocities";
import type { TraverseVelocity } from "../velocity/traverseVelocity";
import { appliedCompressibility, KAPPA } from "../velocity/velocityFromPressure";
import type { Working, WorkingStep } from "../working/working";
import { ratio } from "./airAnswer";

export interface PointAnswer {
  line: number;
  point: number;
  velocity: QuantityOf<"velocity">;
}

export interface StatisticsAnswer {
  /** Points in the average. */
  count: number;
  /** Points that could not be read. */
  skipped: number;
  minimum: QuantityOf<"velocity">;
  maximum: QuantityOf<"velocity">;
  standardDeviation: QuantityOf<"velocity">;
  coefficientOfVariation: QuantityOf<"ratio">;
}

/** What every answer about a traverse says of its velocities. */
export interface VelocityAnswer {
  averageVelocity: QuantityOf<"velocity">;
  points: PointAnswer[];
  statistics: StatisticsAnswer;
  /** The velocity that averaging the pressures would have given; null for velocity readings. */
  averagingPressuresWouldGive: QuantityOf<"velocity"> | null;
}

export function velocityAnswer(traverse: TraverseVelocity, system: UnitSystem): VelocityAnswer {
  const velocity = (metresPerSecond: number): QuantityOf<"velocity"> => inAnswerUnits("velocity", metresPerSecond, system);
  const { points, velocities, average, skipped, fromAveragePressure } = traverse;
  const deviation = standardDeviation(velocities);
  return {
    averageVelocity: velocity(average),
    points: points.map(({ line, point }, index) => ({ line, point, velocity: velocity(velocities[index]!) })),
    statistics: {
      count: points.length,
      skipped,
      minimum: velocity(velocities.reduce((least, one) => Math.min(least, one), Infinity)),
      maximum: velocity(velocities.reduce((greatest, one) => Math.max(greatest, one), 0)),
      standardDeviation: velocity(deviation),
      coefficientOfVariation: { value: average > 0 ? (100 * deviation) / average : 0, unit: "percent" },
    },
    averagingPressuresWouldGive: fromAveragePressure === null ? null : velocity(fromAveragePressure),
  };
}

/** The steps from the readings to the average velocity: each point, then the mean. */
export function addVelocityWorking(working: Working, readings: Readings, traverse: TraverseVelocity, air: ResolvedAir, probe: Probe | undefined, system: UnitSystem): void {
  const inputsOf = readings.kind === "velocity_pressure" ? pressureStep(air, probe, system) : indicatedStep(traverse, air, system);
  for (const [index, point] of traverse.points.entries()) {
    const place = `line ${point.line}, point ${point.point}`;
    if (traverse.instrument?.calibration || point.wasNegative) addReadingStep(working, readings, point, traverse.instrument, place, system);
    working.add({ step: `Velocity at ${place}`, ...inputsOf(point.reading), value: inAnswerUnits("velocity", traverse.velocities[index]!, system) });
  }
  addMeanStep(working, traverse, readings.weights !== undefined, system);
}

/** What was read, where it does not count as it was written. */
function addReadingStep(working: Working, readings: Readings, { line, point, reading }: ReadPoint, instrument: Instrument | undefined, place: string, system: UnitSystem): void {
  const { gain = 1, offset = 0 } = instrument?.calibration ?? {};
  working.add({
    step: `Reading at ${place}`,
    equation: "x = max(0, gain × reading + offset)",
    inputs: { reading: { value: readings.lines[line - 1]![point - 1]!, unit: readings.unit }, gain: ratio(gain), offset: { value: offset, unit: readings.unit } },
    value: inAnswerUnits(readings.kind === "velocity" ? "velocity" : "pressure", reading, system),
    source: "Calibration of the instrument; below zero counts as zero: AMCA 203, from memory",
  });
}

type VelocityStep = Pick<WorkingStep, "equation" | "inputs" | "source">;
type StepOfReading = (reading: number) => VelocityStep;

function pressureStep(air: ResolvedAir, probe: Probe | undefined, system: UnitSystem): StepOfReading {
  const C = ratio(probeCoefficient(probe));
  const ρ = inAnswerUnits("density", air.density, system);
  const p = inAnswerUnits("absolutePressure", staticPressure(air), system);
  return (reading): VelocityStep => {
    const p_v = inAnswerUnits("pressure", reading, system);
    return appliedCompressibility(reading, staticPressure(air)) === 1
      ? { equation: "V = C √(2 p_v / ρ)", inputs: { C, p_v, ρ }, source: "Bernoulli's equation; ISO 3966" }
      : { equation: COMPRESSIBLE_EQUATION, inputs: { C, p_v, ρ, p, κ: ratio(KAPPA) }, source: "ISO 3966 (form from memory), where compressibility exceeds 0.05 %" };
  };
}

const COMPRESSIBLE_EQUATION = "V = C (1 − ε) √(2 p_v / ρ), (1 − ε)² = 1 − r / 2κ + (κ − 1) r² / 6κ², r = p_v / p";

function indicatedStep({ instrument, assumedDensity }: TraverseVelocity, air: ResolvedAir, system: UnitSystem): StepOfReading {
  const corrected = instrument !== undefined && instrument.principle !== "rotating_vane" && assumedDensity !== null;
  const densities: WorkingStep["inputs"] = corrected ? { "ρ₀": inAnswerUnits("density", assumedDensity, system), ρ: inAnswerUnits("density", air.density, system) } : {};
  const equation = INDICATION_EQUATION[instrument?.principle ?? "rotating_vane"];
  const source = instrument ? `The instrument's principle, ${instrument.principle}` : "No instrument was described: velocities taken as actual";
  return (reading) => ({ equation, inputs: { V_ind: inAnswerUnits("velocity", reading, system), ...densities }, source });
}

function addMeanStep(working: Working, { points, velocities, average }: TraverseVelocity, weighted: boolean, system: UnitSystem): void {
  const sum = (weightOf: (index: number) => number): QuantityOf<"velocity"> => inAnswerUnits("velocity", velocities.reduce((total, velocity, index) => total + weightOf(index) * velocity, 0), system);
  working.add({
    step: "Average velocity",
    equation: weighted ? "V̄ = Σ w V / Σ w" : "V̄ = Σ V / n",
    inputs: weighted
      ? { "Σ w V": sum((index) => points[index]!.weight), "Σ w": ratio(points.reduce((total, { weight }) => total + weight, 0)) }
      : { "Σ V": sum(() => 1), n: ratio(points.length) },
    value: inAnswerUnits("velocity", average, system),
    source: "Velocities are averaged, never pressures: AMCA 203, from memory",
  });
}
