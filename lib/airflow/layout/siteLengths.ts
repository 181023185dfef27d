import { DOWNSTREAM_DIAMETERS, UPSTREAM_DIAMETERS } from "../checks/siteDisturbance";
import type { Site } from "../types";
import { toSi } from "../units/convert";
import { METHOD_1_DOWNSTREAM_DIAMETERS, METHOD_1_LEAST_DOWNSTREAM_DIAMETERS, METHOD_1_LEAST_UPSTREAM_DIAMETERS, METHOD_1_UPSTREAM_DIAMETERS } from "./method1";

/** Straight lengths that a standard asks for, in hydraulic diameters. */
export interface SiteRule {
  name: "ashrae_111" | "method_1";
  downstream: number;
  upstream: number;
  source: string;
  /** Lengths below which the standard allows no traverse, with however many points; null where it has none. */
  least: { downstream: number; upstream: number } | null;
}

export const SITE_RULES: readonly SiteRule[] = [
  { name: "ashrae_111", downstream: DOWNSTREAM_DIAMETERS, upstream: UPSTREAM_DIAMETERS, source: "ASHRAE 111, from memory", least: null },
  {
    name: "method_1", downstream: METHOD_1_DOWNSTREAM_DIAMETERS, upstream: METHOD_1_UPSTREAM_DIAMETERS, source: "40 CFR Part 60, Appendix A-1, Method 1",
    least: { downstream: METHOD_1_LEAST_DOWNSTREAM_DIAMETERS, upstream: METHOD_1_LEAST_UPSTREAM_DIAMETERS },
  },
];

/** Straight lengths in hydraulic diameters; null where not known. */
export interface SiteLengths {
  downstream: number | null;
  upstream: number | null;
}

/** A length that meets a limit to the last digits meets it. */
const HAIR = 1e-9;

/** The straight lengths of a site in hydraulic diameters (diameter in m). */
export function siteLengths(site: Site | undefined, diameter: number): SiteLengths {
  const inDiameters = (length: Site["downstream"]): number | null => (length ? toSi("length", length) / diameter : null);
  return { downstream: inDiameters(site?.downstream), upstream: inDiameters(site?.upstream) };
}

/** Whether a site has the straight lengths of a rule; null where a length is not known and the other does not fail already. */
export function meetsSiteRule({ downstream, upstream }: SiteLengths, rule: { downstream: number; upstream: number }): boolean | null {
  const parts = [reaches(downstream, rule.downstream), reaches(upstream, rule.upstream)];
  if (parts.includes(false)) return false;
  return parts.includes(null) ? null : true;
}

const reaches = (length: number | null, needed: number): boolean | null => (length === null ? null : length >= needed * (1 - HAIR));
