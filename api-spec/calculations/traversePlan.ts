import { z } from "zod";
import { defineOperation } from "../define";
import { length } from "../quantities";
import { check, inside, working } from "./answers";
import { EXHAUST_DUCT, LINED_SUPPLY_MAIN } from "./examples";
import { answerOptions, duct, layoutRule, MOST_POINTS, probe, site } from "./shapes";

const fraction = z.number().gt(0).lt(1);
const count = z.int().min(1).max(MOST_POINTS);

const customLine = z
  .strictObject({
    at: fraction.optional().describe("Rectangular and flat oval: place of the line on the face, as a fraction of the face's inside length, from the left or the top."),
    angle: z.number().min(-360).max(360).optional().describe("Round: degrees clockwise from the middle of the face entered; 0 when left out."),
    depths: z.array(fraction).min(1).max(MOST_POINTS).describe("Fractions of the way from the inside face through to the opposite one, ascending."),
    weights: z.array(z.number().gt(0).max(1e6)).optional().describe("A weight for each depth, in any unit; equal weights when left out."),
  })
  .meta({ id: "CustomLine", description: "A line of a custom layout." });

export const planPoints = z
  .strictObject({
    across: count.optional().describe("Rectangular: points along the width. Flat oval: lines through the flat middle."),
    down: count.optional().describe("Rectangular and flat oval: points down the height."),
    perDiameter: count.optional().describe("Round: points on each diameter, an even number. Flat oval: the same for its rounded ends, half of them on each radius."),
    diameters: z.int().min(2).max(3).optional().describe("Round: 2 at 90° or 3 at 60°."),
    lines: z.array(customLine).min(1).max(MOST_POINTS).optional().describe("Custom layouts: the lines themselves."),
  })
  .meta({ id: "PlanPoints", description: "How many points to plan; each count left out is the rule's minimum. Only those that belong to the duct's shape are taken." });

export const face = z.enum(["top", "bottom", "left", "right"]).meta({ id: "Face", description: "A face of the duct, looking in the direction of the flow. On a curve, the quarter it lies in." });

const plannedPoint = z
  .strictObject({
    number: z.int().describe("Counted from the hole, in the order to read."),
    fromInside: length.describe("Insertion depth from the inside face."),
    fromOutside: length.describe("Insertion depth from the outside face: wall and lining added."),
    mark: length.describe("Where to mark the probe, from the axis of its head. The mark is flush with the outside face when the head is at the point."),
    weight: z.number().describe("Share of the cross-section that the point stands for; all of a plan make 1."),
    standsFor: z.int().describe("Points of the rule that it is: more than 1 where the wall limit of Method 1 made several one. Write its reading so many times, or send the weights."),
    position: z.strictObject({ x: length, y: length }).describe("Place in the cross-section, from the left and from the bottom of the inside, looking in the direction of the flow."),
  })
  .meta({ id: "PlannedPoint", description: "A point to read." });

const plannedHole = z
  .strictObject({
    number: z.int(),
    face,
    edge: z
      .enum(["left", "top", "hole_1_clockwise", "hole_1_anticlockwise", "middle_of_end"])
      .describe("From where `along` is measured: an edge of the face, hole 1 one way round, or the middle of a flat oval's rounded end."),
    along: length.describe("Distance of the hole from that edge, between inside faces, or along the inside of a curve."),
    alongOutside: length.describe("The same on the outside, where the hole is marked: wall added, or a tape round the outside of a curve."),
    angle: z.number().nullable().describe("On a curve, degrees clockwise from the top; null on a flat face."),
    points: z.array(plannedPoint),
  })
  .meta({ id: "PlannedHole", description: "A hole to drill, with the points read through it." });

const siteRule = z
  .strictObject({
    name: z.enum(["ashrae_111", "method_1"]),
    downstream: z.number().describe("Straight length asked for from the last disturbance, in hydraulic diameters."),
    upstream: z.number().describe("The same to the next disturbance."),
    source: z.string(),
    meets: z.boolean().nullable().describe("Null where a length was not given."),
  })
  .meta({ id: "SiteRule", description: "The straight lengths of a standard, and whether the site has them." });

const inches = (value: number) => ({ value, unit: "in" as const });

export const traversePlan = defineOperation({
  id: "traversePlan",
  method: "post",
  path: "/calculations/traverse-plan",
  tag: "Calculations",
  scope: "calculations",
  summary: "Plan of a traverse",
  description:
    "Where to drill and how deep to read: for each hole its place on the face, inside and outside, and for each point the insertion depth from the inside and from the outside, where the mark goes on the probe. " +
    "With it the fewest points that the rule asks for, the length of probe it takes, the straight lengths of the site against two standards, and checks.\n\n" +
    "Layouts: rectangular `log_tchebycheff`, `equal_area`, `method_1`; round `log_linear`, `equal_area`, `method_1`; flat oval `log_tchebycheff` or `equal_area` in its middle with equal annuli at its ends (common practice, no source); any shape `custom`.\n\n" +
    "Heed the cautions in the answer before drilling. Results support, and do not replace, local codes, the project specification and licensed or certified practice.",
  body: z.strictObject({
    duct,
    layout: layoutRule,
    points: planPoints.optional(),
    enterFrom: face.optional().describe("Face to drill; the top when left out."),
    probe: probe.optional(),
    site: site.optional(),
    ...answerOptions,
  }),
  answer: z
    .strictObject({
      layout: layoutRule,
      source: z.string().describe("Where the layout comes from, and how surely."),
      holes: z.array(plannedHole),
      points: z.int().describe("Points to read."),
      minimumPoints: z.int().nullable().describe("Least that the rule asks for; null for a custom layout."),
      probeLength: length.describe("From the outside face to the farthest point; what one holds it by not counted."),
      inside,
      hydraulicDiameter: length,
      site: z.strictObject({
        downstreamDiameters: z.number().nullable().describe("Straight length from the last disturbance in hydraulic diameters; null where not given."),
        upstreamDiameters: z.number().nullable(),
        rules: z.array(siteRule),
      }),
      checks: z.array(check),
      cautions: z.array(z.string()).readonly().describe("What to heed before drilling and after."),
      working,
    })
    .meta({ id: "TraversePlanAnswer" }),
  problems: ["impossible-input"],
  figure: "A sheet for the site: the cross-section to scale with holes, depths and numbered points, the marks for the probe, and a blank box for each reading.",
  examples: [
    {
      name: "lined-rectangular",
      summary: "A lined supply main entered from the top, log-Tchebycheff, with the probe and the site at hand",
      body: {
        duct: LINED_SUPPLY_MAIN,
        layout: "log_tchebycheff" as const,
        enterFrom: "top" as const,
        probe: { diameter: inches(0.3125), length: inches(18) },
        site: { downstream: { value: 13, unit: "ft" as const }, upstream: { value: 5, unit: "ft" as const } },
        working: true,
      },
    },
    {
      name: "round-two-diameters",
      summary: "A round exhaust duct of 14 in, log-linear, ten points on each of two diameters, entered from below",
      body: { duct: EXHAUST_DUCT, layout: "log_linear" as const, points: { perDiameter: 10, diameters: 2 }, enterFrom: "bottom" as const },
    },
    {
      name: "flat-oval",
      summary: "A flat oval duct, equal area in the middle and equal annuli at the ends, in SI",
      body: { duct: { shape: "flat_oval" as const, measured: "inside" as const, major: { value: 900, unit: "mm" as const }, minor: { value: 350, unit: "mm" as const } }, layout: "equal_area" as const, units: "si" as const },
    },
    {
      name: "method-1-stack",
      summary: "A stack of 30 in by Method 1, with 8 and 2 diameters of straight run",
      body: { duct: { shape: "round" as const, measured: "inside" as const, diameter: inches(30), wall: { thickness: inches(0.25) } }, layout: "method_1" as const, enterFrom: "left" as const, site: { downstream: inches(260), upstream: inches(70) } },
    },
    {
      name: "custom-lines",
      summary: "Two lines of one's own with weights, between the stiffeners of a duct",
      body: {
        duct: { shape: "rectangular" as const, measured: "inside" as const, width: inches(40), height: inches(20) },
        layout: "custom" as const,
        points: { lines: [{ at: 0.25, depths: [0.1, 0.5, 0.9], weights: [1, 2, 1] }, { at: 0.75, depths: [0.1, 0.5, 0.9], weights: [1, 2, 1] }] },
      },
    },
  ],
});
