import { weightedMean } from "../velocity/mean";
import type { CheckFunction } from "./context";

const GREATEST_DIFFERENCE_PERCENT = 20;

/** Halves of the grid that differ: along the lines, and across them. The lines of a round duct are its diameters. */
export const profileAsymmetry: CheckFunction = ({ readings, traverse }) => {
  const differences = [alongLines(readings.lines, traverse.points, traverse.velocities), acrossLines(readings.lines.length, traverse.points, traverse.velocities)];
  const known = differences.filter((difference) => difference !== null);
  if (known.length === 0 || traverse.average === 0) return null;
  const difference = (100 * Math.max(...known)) / traverse.average;
  const passed = difference <= GREATEST_DIFFERENCE_PERCENT;
  return {
    code: "profile_asymmetry",
    passed,
    severity: "caution",
    detail: passed
      ? "Both halves of the profile carry about the same flow."
      : "One half of the duct, or one of its diameters, carries much more than the other, as behind an elbow, a damper or a branch. The traverse may not represent the flow.",
    compared: { quantity: "difference of the halves' averages over the average", value: difference, limit: GREATEST_DIFFERENCE_PERCENT, unit: "percent" },
    source: "common practice, no source",
  };
};

type Place = { line: number; point: number };

const alongLines = (lines: readonly (readonly unknown[])[], points: readonly Place[], velocities: readonly number[]): number | null =>
  halvesDiffer(points, velocities, ({ line, point }) => point - (lines[line - 1]!.length + 1) / 2);

const acrossLines = (lineCount: number, points: readonly Place[], velocities: readonly number[]): number | null =>
  halvesDiffer(points, velocities, ({ line }) => line - (lineCount + 1) / 2);

/** Difference of the averages of the points on either side of the middle, in m/s; null where a side has none. */
function halvesDiffer(points: readonly Place[], velocities: readonly number[], side: (place: Place) => number): number | null {
  const below = velocities.filter((_, index) => side(points[index]!) < 0);
  const above = velocities.filter((_, index) => side(points[index]!) > 0);
  if (below.length === 0 || above.length === 0) return null;
  const mean = (values: number[]): number => weightedMean(values, values.map(() => 1));
  return Math.abs(mean(below) - mean(above));
}
