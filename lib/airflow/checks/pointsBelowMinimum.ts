import { ruleSource } from "../layout/ruleSource";
import type { CheckFunction } from "./context";

/** Whether as many points were read as the layout's rule asks for; those that could not be read are not counted. */
export const pointsBelowMinimum: CheckFunction = ({ traverse: { points, skipped }, inside, layout, minimumPoints }) => {
  if (!inside || !layout || minimumPoints === null || minimumPoints === undefined) return null;
  const count = points.length;
  const passed = count >= minimumPoints;
  return {
    code: "points_below_minimum",
    passed,
    severity: "caution",
    detail: passed
      ? "As many points were read as the layout's rule asks for."
      : `${count} points were read${skipped > 0 ? ` and ${skipped} could not be` : ""}; the layout's rule asks for at least ${minimumPoints} in this duct. Count on a larger uncertainty, or read the rest.`,
    compared: { quantity: "points read", value: count, limit: minimumPoints, unit: null },
    source: ruleSource(layout, inside.shape),
  };
};
