import type { CheckFunction } from "./context";

/** Readings below zero: they count as zero and stay in the count. */
export const negativeReading: CheckFunction = ({ traverse }) => {
  const at = traverse.points.filter(({ wasNegative }) => wasNegative).map(({ line, point }) => ({ line, point }));
  const passed = at.length === 0;
  return {
    code: "negative_reading",
    passed,
    severity: "caution",
    detail: passed
      ? "No reading is below zero."
      : `${at.length} of ${traverse.points.length} readings are below zero; each counts as zero and stays in the count. The air turns back there: look for another place to traverse.`,
    compared: { quantity: "readings below zero", value: at.length, limit: 0, unit: null },
    source: "AMCA 203, from memory",
    ...(!passed && { at }),
  };
};
