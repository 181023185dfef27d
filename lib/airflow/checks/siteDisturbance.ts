import { hydraulicDiameter } from "../duct/hydraulicDiameter";
import { requireWithin } from "../errors";
import type { Site } from "../types";
import { toSi } from "../units/convert";
import type { QuantityOf } from "../units/units";
import type { CheckFunction } from "./context";

/** Straight lengths, in hydraulic diameters, that a good site has. */
export const DOWNSTREAM_DIAMETERS = 7.5;
export const UPSTREAM_DIAMETERS = 3;

/** In m. */
const STRAIGHT_LIMITS = [0, 10_000] as const;

/**
 * A straight length of the site.
 * @returns Length in m.
 * @throws {AirflowInputError} Below 0, or longer than any duct.
 */
export const straightLength = (side: keyof Site, length: QuantityOf<"length">): number =>
  requireWithin(toSi("length", length), STRAIGHT_LIMITS, { path: ["site", side], code: "straight_length_out_of_range", detail: "A straight length of 0 to 10,000 m is taken. Check the unit." });

/** Whether the straight lengths before and behind the plane suffice. */
export const siteDisturbance: CheckFunction = ({ inside, site }) => {
  if (!inside || (!site?.downstream && !site?.upstream)) return null;
  const diameter = hydraulicDiameter(inside);
  const parts = [
    { side: "downstream" as const, needed: DOWNSTREAM_DIAMETERS, quantity: "straight length from the last disturbance, in hydraulic diameters" },
    { side: "upstream" as const, needed: UPSTREAM_DIAMETERS, quantity: "straight length to the next disturbance, in hydraulic diameters" },
  ].flatMap(({ side, needed, quantity }) => {
    const given = site[side];
    return given ? [{ quantity, needed, value: straightLength(side, given) / diameter }] : [];
  });
  const worst = parts.reduce((one, other) => (other.value / other.needed < one.value / one.needed ? other : one));
  const passed = worst.value >= worst.needed;
  return {
    code: "site_disturbance",
    passed,
    severity: "caution",
    detail: passed
      ? "The straight lengths given suffice."
      : `The plane is too near a disturbance: ${worst.value.toFixed(1)} of ${worst.needed} hydraulic diameters. Move it, or count on a larger uncertainty.`,
    compared: { quantity: worst.quantity, value: worst.value, limit: worst.needed, unit: null },
    source: "ASHRAE 111, from memory (7.5 and 3 diameters)",
  };
};
