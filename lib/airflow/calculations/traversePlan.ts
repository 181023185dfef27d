import type { Check } from "../checks/check";
import type { Edge, Face, LayoutPoint, TraverseLine } from "../layout/line";
import { CAUTIONS } from "../layout/cautions";
import { planTraverse, type PlanInput, type TraversePlan } from "../layout/plan";
import { planChecks } from "../layout/planChecks";
import { meetsSiteRule, SITE_RULES, type SiteRule } from "../layout/siteLengths";
import type { AnswerOptions, LayoutRule } from "../types";
import { inAnswerUnits } from "../units/convert";
import type { QuantityOf, UnitSystem } from "../units/units";
import type { WorkingStep } from "../working/working";
import { insideAnswer, type InsideAnswer } from "./ductArea";
import { resolveOptions, workingPart } from "./options";
import { addPlanWorking } from "./planWorking";

export interface TraversePlanInput extends AnswerOptions, PlanInput {}

/** One point to read, counted from the hole. */
export interface PlannedPoint {
  number: number;
  /** From the inside face along the probe. */
  fromInside: QuantityOf<"length">;
  /** From the outside face: wall and lining added. */
  fromOutside: QuantityOf<"length">;
  /** Where to mark the probe, from the axis of its head; the mark is flush with the outside face when the head is at the point. */
  mark: QuantityOf<"length">;
  /** Share of the cross-section; all of a plan make 1. */
  weight: number;
  /** Points of the rule that it stands for: more than 1 where the wall limit of Method 1 made several one. */
  standsFor: number;
  /** Place in the cross-section, from the left and from the bottom of the inside, looking in the direction of the flow. */
  position: { x: QuantityOf<"length">; y: QuantityOf<"length"> };
}

export interface PlannedHole {
  number: number;
  face: Face;
  /** From where `along` is measured. */
  edge: Edge;
  /** From the edge, between inside faces or along the inside of a curve. */
  along: QuantityOf<"length">;
  /** The same on the outside, where the hole is marked. */
  alongOutside: QuantityOf<"length">;
  /** On a curve, degrees clockwise from the top; null on a flat face. */
  angle: number | null;
  points: PlannedPoint[];
}

export interface PlannedSite {
  /** Straight lengths in hydraulic diameters; null where not given. */
  downstreamDiameters: number | null;
  upstreamDiameters: number | null;
  rules: (Omit<SiteRule, "least"> & { meets: boolean | null })[];
}

export interface TraversePlanAnswer {
  layout: LayoutRule;
  /** Where the layout comes from, and how surely. */
  source: string;
  holes: PlannedHole[];
  /** Points to read. */
  points: number;
  /** Least that the rule asks for; null for a custom layout. */
  minimumPoints: number | null;
  /** From the outside face to the farthest point: what the probe must reach, handle not counted. */
  probeLength: QuantityOf<"length">;
  inside: InsideAnswer;
  hydraulicDiameter: QuantityOf<"length">;
  site: PlannedSite;
  checks: Check[];
  cautions: readonly string[];
  working?: WorkingStep[];
}

/**
 * Plan of a traverse: where to drill, how deep to read, how long a probe it takes, and what to heed.
 * @throws {AirflowInputError} A duct that cannot be; a layout, counts or a face that do not fit it.
 */
export function traversePlan(input: TraversePlanInput): TraversePlanAnswer {
  const { system, working } = resolveOptions(input);
  const plan = planTraverse(input);
  if (working) addPlanWorking(working, input.duct, plan, system);
  return {
    layout: plan.layout,
    source: plan.source,
    holes: plan.lines.map((line, index) => plannedHole(line, index + 1, system)),
    points: plan.points,
    minimumPoints: plan.minimumPoints,
    probeLength: inAnswerUnits("length", plan.probeLength, system),
    inside: insideAnswer(plan.inside, system),
    hydraulicDiameter: inAnswerUnits("length", plan.hydraulicDiameter, system),
    site: plannedSite(plan),
    checks: planChecks(plan, system),
    cautions: CAUTIONS,
    ...workingPart(working),
  };
}

function plannedHole(line: TraverseLine, number: number, system: UnitSystem): PlannedHole {
  return {
    number,
    face: line.face,
    edge: line.edge,
    along: inAnswerUnits("length", line.along, system),
    alongOutside: inAnswerUnits("length", line.alongOutside, system),
    angle: line.angle,
    points: line.points.map((point, index) => plannedPoint(point, line.wall, index + 1, system)),
  };
}

function plannedPoint({ depth, weight, standsFor, x, y }: LayoutPoint, wall: number, number: number, system: UnitSystem): PlannedPoint {
  const length = (metres: number): QuantityOf<"length"> => inAnswerUnits("length", metres, system);
  return { number, fromInside: length(depth), fromOutside: length(wall + depth), mark: length(wall + depth), weight, standsFor, position: { x: length(x), y: length(y) } };
}

const plannedSite = ({ site }: TraversePlan): PlannedSite => ({
  downstreamDiameters: site.downstream,
  upstreamDiameters: site.upstream,
  rules: SITE_RULES.map(({ name, downstream, upstream, source }) => ({ name, downstream, upstream, source, meets: meetsSiteRule(site, { downstream, upstream }) })),
});
