import { COMPRESSIBILITY_THRESHOLD } from "../velocity/velocityFromPressure";
import type { CheckFunction } from "./context";

/** Whether the air was fast enough for its compressibility to matter; where it was, the velocities are corrected. */
export const compressibility: CheckFunction = ({ traverse: { leastCompressibility }, air: { absolutePressure } }) => {
  if (leastCompressibility === null) return null;
  const correction = 1 - leastCompressibility;
  const passed = correction <= COMPRESSIBILITY_THRESHOLD;
  return {
    code: "compressibility",
    passed,
    severity: "information",
    detail: passed
      ? "Compressibility is negligible at these velocities."
      : `Compressibility is not negligible at the fastest points; their velocities were corrected for it.${absolutePressure === null ? " The pressure in the duct is not known, so that of sea level was taken." : ""}`,
    compared: { quantity: "greatest correction of a velocity for compressibility", value: 100 * correction, limit: 100 * COMPRESSIBILITY_THRESHOLD, unit: "percent" },
    source: "ISO 3966, form from memory",
  };
};
