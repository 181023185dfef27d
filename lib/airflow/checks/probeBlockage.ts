import type { InsideDuct } from "../duct/insideDuct";
import { requireWithin } from "../errors";
import { toSi } from "../units/convert";
import type { Check } from "./check";
import type { CheckContext } from "./context";

const GREATEST_RATIO = 0.02;
/** In m. */
const DIAMETER_LIMITS = [0, 1] as const;

const smallestDimension = (inside: InsideDuct): number => {
  switch (inside.shape) {
    case "rectangular":
      return Math.min(inside.width, inside.height);
    case "round":
      return inside.diameter;
    case "flat_oval":
      return inside.minor;
  }
};

/** Whether the probe is thin enough not to change the flow it measures. */
export const probeBlockage = ({ inside, probe }: Pick<CheckContext, "inside" | "probe">): Check | null => {
  if (!inside || !probe?.diameter) return null;
  const diameter = requireWithin(toSi("length", probe.diameter), DIAMETER_LIMITS, {
    path: ["probe", "diameter"], code: "probe_diameter_out_of_range", detail: "A probe diameter of 0 to 1 m is taken. Check the unit.",
  });
  const ratio = diameter / smallestDimension(inside);
  const passed = ratio <= GREATEST_RATIO;
  return {
    code: "probe_blockage",
    passed,
    severity: "caution",
    detail: passed ? "The probe is thin against the duct." : "The probe is thick against the duct and speeds up the air it measures. Use a thinner probe.",
    compared: { quantity: "probe diameter over smallest inside dimension", value: ratio, limit: GREATEST_RATIO, unit: null },
    source: "ISO 3966, from memory",
  };
};
