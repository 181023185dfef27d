import type { CheckFunction } from "./context";

const LEAST_SHARE_PERCENT = 75;
const SHARE_OF_GREATEST = 0.1;

/** At least 75 % of the velocity pressures above a tenth of the greatest; velocities are squared to compare. */
export const uniformity: CheckFunction = ({ traverse: { velocities } }) => {
  const pressures = velocities.map((velocity) => velocity ** 2);
  const limit = SHARE_OF_GREATEST * pressures.reduce((greatest, pressure) => Math.max(greatest, pressure), 0);
  const share = (100 * pressures.filter((pressure) => pressure > limit).length) / pressures.length;
  const passed = share >= LEAST_SHARE_PERCENT;
  return {
    code: "uniformity",
    passed,
    severity: "failure",
    detail: passed
      ? "The velocity profile is even enough for a traverse here."
      : "Too many velocity pressures are below a tenth of the greatest: the profile is too uneven for a traverse here. Find a longer straight run.",
    compared: { quantity: "share of velocity pressures above a tenth of the greatest", value: share, limit: LEAST_SHARE_PERCENT, unit: "percent" },
    source: "AMCA 203, from memory",
  };
};
