import { hydraulicDiameter } from "../duct/hydraulicDiameter";
import { insideDuct, wallThickness, type InsideDuct } from "../duct/insideDuct";
import { AirflowInputError, type Path } from "../errors";
import type { Duct, LayoutRule, Probe, Site } from "../types";
import { toSi } from "../units/convert";
import type { QuantityOf } from "../units/units";
import { layoutLines, planCounts } from "./layoutLines";
import type { Face, TraverseLine } from "./line";
import { minimumPoints, type PointCounts } from "./minimumPoints";
import type { PlanPoints } from "./request";
import { ruleSource } from "./ruleSource";
import { siteLengths, type SiteLengths } from "./siteLengths";

export interface PlanInput {
  duct: Duct;
  layout: LayoutRule;
  points?: PlanPoints;
  enterFrom?: Face;
  probe?: Probe;
  site?: Site;
}

/** A traverse planned, in m. */
export interface TraversePlan {
  inside: InsideDuct;
  /** Wall and lining on each face. */
  wall: number;
  layout: LayoutRule;
  /** Where the layout comes from. */
  source: string;
  lines: TraverseLine[];
  /** How many points were asked for on each side or diameter; null for a custom layout. */
  counts: Required<PointCounts> | null;
  /** Least that the rule asks for; null for a custom layout. */
  minimumPoints: number | null;
  /** Places to read. */
  points: number;
  /** Points of the rule, which are more where the wall limit of Method 1 made several one. */
  countedPoints: number;
  /** From the outside face to the farthest point. */
  probeLength: number;
  hydraulicDiameter: number;
  site: SiteLengths;
  givenSite: Site | undefined;
  probe: Probe | undefined;
  /** 0 where it is not known. */
  probeDiameter: number;
  givenProbeLength: number | null;
}

/**
 * Plans a traverse: holes, points in the order to read them, and how long a probe it takes.
 * @throws {AirflowInputError} A duct that cannot be; a layout, counts or a face that do not fit it; a length below 0.
 */
export function planTraverse({ duct, layout, points, enterFrom, probe, site }: PlanInput): TraversePlan {
  const inside = insideDuct(duct);
  const wall = wallThickness(duct);
  requireLengths({ probe, site });
  const probeDiameter = probe?.diameter ? toSi("length", probe.diameter) : 0;
  const request = { layout, points, enterFrom, site, probeDiameter };
  const lines = layoutLines({ inside, wall }, request);
  const all = lines.flatMap((line) => line.points.map((point) => ({ ...point, reach: line.wall + point.depth })));
  const diameter = hydraulicDiameter(inside);
  return {
    inside, wall, layout, lines, probe, probeDiameter,
    source: ruleSource(layout, inside.shape),
    counts: planCounts(inside, request),
    minimumPoints: minimumPoints(inside, layout, site),
    points: all.length,
    countedPoints: all.reduce((sum, { standsFor }) => sum + standsFor, 0),
    probeLength: all.reduce((greatest, { reach }) => Math.max(greatest, reach), 0),
    hydraulicDiameter: diameter,
    site: siteLengths(site, diameter),
    givenSite: site,
    givenProbeLength: probe?.length ? toSi("length", probe.length) : null,
  };
}

function requireLengths({ probe, site }: Pick<PlanInput, "probe" | "site">): void {
  const lengths: [Path, QuantityOf<"length"> | undefined][] = [
    [["probe", "diameter"], probe?.diameter],
    [["probe", "length"], probe?.length],
    [["site", "downstream"], site?.downstream],
    [["site", "upstream"], site?.upstream],
  ];
  for (const [path, length] of lengths) {
    if (length && length.value < 0) throw new AirflowInputError({ path, code: "negative_length", detail: `The length is ${length.value} ${length.unit}; it cannot be below 0.` });
  }
}
