import { area } from "../duct/area";
import { hydraulicDiameter } from "../duct/hydraulicDiameter";
import type { InsideDuct } from "../duct/insideDuct";
import { DOWNSTREAM_DIAMETERS, straightLength, UPSTREAM_DIAMETERS } from "../checks/siteDisturbance";
import { requireWithin } from "../errors";
import type { LayoutRule } from "../types";
import { toSi } from "../units/convert";
import { densityExponent } from "../velocity/densityExponent";
import type { BudgetInput, Influence } from "./budget";
import { RECTANGULAR } from "./rectangular";

/** Half-width of a dimension measured with a tape, 1/16 in. */
const DIMENSION_HALF_WIDTH = toSi("length", { value: 1 / 16, unit: "in" });
/** In m; a dimension less certain than this was not measured. */
const HALF_WIDTH_LIMITS = [0, 1] as const;
const LAYOUT_PERCENT: Record<LayoutRule, number> = { log_tchebycheff: 1, log_linear: 1, method_1: 1.5, equal_area: 1.5, custom: 2 };
const UNNAMED_LAYOUT_PERCENT = 2;
const SITE_PERCENT = { good: 0, unknown: 1, disturbed: 1.5 } as const;
const DENSITY_PERCENT = 0.5;

/** Layout and count: how well the points stand for the whole cross-section; more when there are too few. */
export function layoutRow({ layout, minimumPoints, traverse, options }: BudgetInput): Influence {
  const count = traverse.points.length;
  const shortfall = minimumPoints && count < minimumPoints ? minimumPoints / count : 1;
  const base = options.layoutPercent ?? (layout ? LAYOUT_PERCENT[layout] : UNNAMED_LAYOUT_PERCENT);
  const short = shortfall > 1 ? `, times ${minimumPoints}/${count} for the missing points` : "";
  return {
    name: "layout",
    percent: base * shortfall,
    origin: options.layoutPercent === undefined ? "default" : "given",
    detail: `${layout ? `Layout ${layout}` : "No layout named"}, ${count} points: ${base} %${short}`,
  };
}

/** Site: how far disturbances may bend the profile. */
export function siteRow({ site, inside, options }: BudgetInput): Influence {
  if (options.sitePercent !== undefined) return { name: "site", percent: options.sitePercent, origin: "given", detail: "Site, as given" };
  if (!site?.downstream || !site.upstream) return { name: "site", percent: SITE_PERCENT.unknown, origin: "default", detail: "Straight lengths not known" };
  const diameter = hydraulicDiameter(inside);
  const good = straightLength("downstream", site.downstream) >= DOWNSTREAM_DIAMETERS * diameter && straightLength("upstream", site.upstream) >= UPSTREAM_DIAMETERS * diameter;
  return {
    name: "site",
    percent: good ? SITE_PERCENT.good : SITE_PERCENT.disturbed,
    origin: "default",
    detail: good ? "Straight lengths meet 7.5 and 3 hydraulic diameters" : "Straight lengths fall short of 7.5 and 3 hydraulic diameters",
  };
}

/** Area: each dimension within its half-width, by the area's sensitivity to it. */
export function areaRow({ inside, options }: BudgetInput): Influence {
  const halfWidth = requireWithin(options.dimension ? toSi("length", options.dimension) : DIMENSION_HALF_WIDTH, HALF_WIDTH_LIMITS, {
    path: ["uncertainty", "dimension"], code: "uncertainty_out_of_range", detail: "A dimension's half-width of 0 to 1 m is taken. Check the unit.",
  });
  const relative = Math.hypot(...relativeSensitivities(inside)) * halfWidth * RECTANGULAR;
  return {
    name: "area",
    percent: 100 * relative,
    origin: options.dimension ? "given" : "default",
    detail: `Each dimension within ± ${(1000 * halfWidth).toPrecision(3)} mm, rectangular distribution`,
  };
}

/** (∂A/∂x) / A for each dimension x, in 1/m. */
function relativeSensitivities(inside: InsideDuct): number[] {
  switch (inside.shape) {
    case "rectangular":
      return [1 / inside.width, 1 / inside.height];
    case "round":
      return [2 / inside.diameter];
    case "flat_oval": {
      const { major, minor } = inside;
      const total = area(inside);
      return [minor / total, (major + (Math.PI / 2 - 2) * minor) / total];
    }
  }
}

/**
 * Density, by the power of it that the airflow goes with. From a pressure: half of its relative uncertainty, of actual and of
 * standard airflow. From a thermal instrument: all of it in the actual airflow, none in the standard. From a vane: the reverse.
 */
export function densityRow({ readings, instrument, basis, options, airWasGiven }: BudgetInput): Influence {
  const percent = options.densityPercent ?? DENSITY_PERCENT;
  const sensitivity = Math.abs(densityExponent(readings, instrument) + (basis === "standard" ? 1 : 0));
  return {
    name: "density",
    percent: percent * sensitivity,
    origin: options.densityPercent === undefined ? "default" : "given",
    detail: `Density within ${percent} %, sensitivity ${sensitivity}${airWasGiven ? "" : "; the air was assumed, and what that may shift is not in the budget"}`,
  };
}
