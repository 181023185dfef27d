import type { Check } from "../checks/check";
import { probeBlockage } from "../checks/probeBlockage";
import { inAnswerUnits } from "../units/convert";
import type { UnitSystem } from "../units/units";
import { wallDistance } from "./chord";
import { countShortfall } from "./countShortfall";
import { METHOD_1_LEAST_DIAMETER, wallLimit } from "./method1";
import type { TraversePlan } from "./plan";
import { meetsSiteRule, SITE_RULES } from "./siteLengths";

type PlanCheckFunction = (plan: TraversePlan, system: UnitSystem) => Check | null;

const METHOD_1 = "40 CFR Part 60, Appendix A-1, Method 1";
const HAIR = 1e-9;

/** Every check that applies to a plan, in a fixed order. */
export const planChecks = (plan: TraversePlan, system: UnitSystem): Check[] =>
  [enoughPoints, nearWall, largeEnough, siteDisturbance, thinEnough, longEnough].map((check) => check(plan, system)).filter((check) => check !== null);

/** A length in the answer's unit, for a check's comparison and its words. */
function measure(metres: number, system: UnitSystem): { value: number; unit: string; words: string } {
  const { value, unit } = inAnswerUnits("length", metres, system);
  return { value, unit, words: `${value.toFixed(system === "ip" ? 2 : 0)} ${unit}` };
}

const enoughPoints: PlanCheckFunction = (plan, system) => {
  if (plan.minimumPoints === null) return null;
  const shortfall = countShortfall(plan, system);
  const compared = shortfall?.compared ?? { quantity: "points", value: plan.countedPoints, limit: plan.minimumPoints, unit: null };
  return { code: "points_below_minimum", passed: !shortfall, severity: "caution", detail: shortfall?.detail ?? "The plan has the points that its rule asks for.", compared, source: plan.source };
};

const nearWall: PlanCheckFunction = ({ inside, lines, layout, probeDiameter }, system) => {
  const limit = wallLimit(inside, probeDiameter);
  const places = lines.flatMap(({ points }, line) => points.map((point, index) => ({ line: line + 1, point: index + 1, distance: wallDistance(inside, point) })));
  const near = places.filter(({ distance }) => distance < limit - HAIR);
  const nearest = places.reduce((least, { distance }) => Math.min(least, distance), Infinity);
  const combined = lines.some(({ points }) => points.some(({ standsFor }) => standsFor > 1));
  const { value, unit, words } = measure(nearest, system);
  const limitWords = measure(limit, system).words;
  return {
    code: "near_wall",
    passed: near.length === 0,
    severity: "caution",
    detail: near.length > 0
      ? `The nearest point is ${words} from the wall, nearer than ${limitWords}. A probe reads unsurely there: see that its head clears the wall, or choose fewer points.`
      : `No point is nearer the wall than ${limitWords}.${layout === "method_1" && combined ? " Points that the limit brought together are one: write its reading once for each that it stands for." : ""}`,
    compared: { quantity: "distance of the nearest point from the wall", value, limit: measure(limit, system).value, unit },
    source: `${METHOD_1} (wall limits from memory)`,
    ...(near.length > 0 && { at: near.map(({ line, point }) => ({ line, point })) }),
  };
};

const largeEnough: PlanCheckFunction = ({ layout, hydraulicDiameter }, system) => {
  if (layout !== "method_1") return null;
  const passed = hydraulicDiameter >= METHOD_1_LEAST_DIAMETER - HAIR;
  const { value, unit } = measure(hydraulicDiameter, system);
  return {
    code: "duct_below_minimum",
    passed,
    severity: "failure",
    detail: passed ? "The duct is large enough for Method 1." : "Method 1 is not for ducts under about 12 in (0.30 m). Method 1A covers smaller ones; it is not part of this plan.",
    compared: { quantity: "hydraulic diameter", value, limit: measure(METHOD_1_LEAST_DIAMETER, system).value, unit },
    source: METHOD_1,
  };
};

/** Against the rule that goes with the layout: Method 1's own, else that of ASHRAE 111. */
const siteDisturbance: PlanCheckFunction = ({ layout, site }) => {
  const rule = SITE_RULES.find(({ name }) => name === (layout === "method_1" ? "method_1" : "ashrae_111"))!;
  const tooNear = rule.least !== null && meetsSiteRule(site, rule.least) === false;
  const needed = tooNear ? rule.least! : rule;
  const parts = [
    { length: site.downstream, needed: needed.downstream, quantity: "straight length from the last disturbance, in hydraulic diameters" },
    { length: site.upstream, needed: needed.upstream, quantity: "straight length to the next disturbance, in hydraulic diameters" },
  ].flatMap(({ length, ...rest }) => (length === null ? [] : [{ ...rest, length }]));
  const [first] = parts;
  if (!first) return null;
  const worst = parts.reduce((one, other) => (other.length / other.needed < one.length / one.needed ? other : one), first);
  const passed = meetsSiteRule(site, rule) !== false;
  return {
    code: "site_disturbance",
    passed,
    severity: tooNear ? "failure" : "caution",
    detail: siteDetail(passed, tooNear, parts.length === 2, `${worst.length.toFixed(1)} of ${worst.needed} hydraulic diameters`),
    compared: { quantity: worst.quantity, value: worst.length, limit: worst.needed, unit: null },
    source: rule.source,
  };
};

function siteDetail(passed: boolean, tooNear: boolean, bothKnown: boolean, shortfall: string): string {
  if (passed) return bothKnown ? "The straight lengths suffice." : "The straight length given suffices; the other is not known.";
  if (tooNear) return `The plane is nearer to a disturbance than Method 1 allows with any number of points: ${shortfall}. Move it.`;
  return `The plane is too near a disturbance: ${shortfall}. Move it, or count on a larger uncertainty.`;
}

const thinEnough: PlanCheckFunction = ({ inside, probe }) => probeBlockage({ inside, probe });

const longEnough: PlanCheckFunction = ({ probeLength, givenProbeLength }, system) => {
  if (givenProbeLength === null) return null;
  const passed = givenProbeLength >= probeLength - HAIR;
  const { value, unit, words } = measure(givenProbeLength, system);
  const needed = measure(probeLength, system);
  return {
    code: "probe_length",
    passed,
    severity: "failure",
    detail: passed
      ? "The probe reaches every point."
      : `The probe is ${words} long; the farthest point needs ${needed.words}. Use a longer probe${givenProbeLength > probeLength / 2 ? ", or drill the opposite face too and read the far points from there" : ""}.`,
    compared: { quantity: "usable length of the probe", value, limit: needed.value, unit },
    source: "Geometry of the plan",
  };
};
