import type { ResolvedAir } from "../air/resolveAir";
import type { Probe, Readings } from "../types";
import { inAnswerUnits } from "../units/convert";
import type { QuantityOf, UnitSystem } from "../units/units";
import { standardDeviation } from "../velocity/mean";
import { probeCoefficient } from "../velocity/pointVelocities";
import type { TraverseVelocity } from "../velocity/traverseVelocity";
import type { Working } from "../working/working";
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
  const { points, velocities, average, indicationFactor } = traverse;
  const density = inAnswerUnits("density", air.density, system);
  for (const [index, { line, point, reading }] of points.entries()) {
    const value = inAnswerUnits("velocity", velocities[index]!, system);
    const step = `Velocity at line ${line}, point ${point}`;
    if (readings.kind === "velocity_pressure") {
      const p_v = inAnswerUnits("pressure", reading, system);
      working.add({ step, equation: "V = C √(2 p_v / ρ)", inputs: { C: ratio(probeCoefficient(probe)), p_v, ρ: density }, value, source: "Bernoulli's equation; ISO 3966, with (1 − ε) where it exceeds 0.05 %" });
    } else {
      const V_ind = inAnswerUnits("velocity", reading, system);
      working.add({ step, equation: "V = V_ind × factor", inputs: { V_ind, factor: ratio(indicationFactor ?? 1) }, value, source: "The instrument's principle" });
    }
  }
  working.add({
    step: "Average velocity",
    equation: readings.weights ? "V̄ = Σ w V / Σ w" : "V̄ = Σ V / n",
    inputs: { n: ratio(points.length), "Σ V": inAnswerUnits("velocity", velocities.reduce((sum, velocity) => sum + velocity, 0), system) },
    value: inAnswerUnits("velocity", average, system),
    source: "Velocities are averaged, never pressures: AMCA 203, from memory",
  });
}
