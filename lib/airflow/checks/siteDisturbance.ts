import { hydraulicDiameter } from "../duct/hydraulicDiameter";
import { toSi } from "../units/convert";
import type { CheckFunction } from "./context";

/** Straight lengths, in hydraulic diameters, that a good site has. */
export const DOWNSTREAM_DIAMETERS = 7.5;
export const UPSTREAM_DIAMETERS = 3;

/** Whether the straight lengths before and behind the plane suffice. */
export const siteDisturbance: CheckFunction = ({ inside, site }) => {
  if (!inside || (!site?.downstream && !site?.upstream)) return null;
  const diameter = hydraulicDiameter(inside);
  const parts = [
    { given: site.downstream, needed: DOWNSTREAM_DIAMETERS, quantity: "straight length from the last disturbance, in hydraulic diameters" },
    { given: site.upstream, needed: UPSTREAM_DIAMETERS, quantity: "straight length to the next disturbance, in hydraulic diameters" },
  ].flatMap(({ given, needed, quantity }) => (given ? [{ quantity, needed, value: toSi("length", given) / diameter }] : []));
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
