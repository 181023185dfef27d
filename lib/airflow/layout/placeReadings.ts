import type { InsideDuct } from "../duct/insideDuct";
import { AirflowInputError } from "../errors";
import type { LayoutRule } from "../types";
import { extent, faceLine, type WalledDuct } from "./chord";
import { cellCentres } from "./equalArea";
import { layoutLines } from "./layoutLines";
import { pointAt, withUnitWeight, type Face, type TraverseLine } from "./line";
import { appliesTo } from "./minimumPoints";
import type { PlanPoints } from "./request";
import { diameterLine } from "./round";

/** Readings with their places in the duct. */
export interface PlacedReadings {
  lines: TraverseLine[];
  /** Whether the places are those of a rule; otherwise the points are spread evenly and the drawing is a sketch. */
  byRule: boolean;
}

/**
 * Where the readings of a traverse were taken, from nothing but how many there are on each line. The rule named is tried
 * first, then those that fit the shape; where none has that many points they are spread evenly.
 * @param duct Inside dimensions and wall in m.
 * @param perLine How many readings each line has.
 * @returns Lines in the shape of the readings, places in m from the left and the bottom of the inside.
 */
export function placeReadings(duct: WalledDuct, perLine: readonly number[], layout?: LayoutRule, enterFrom: Face = "top"): PlacedReadings {
  const rules = candidateRules(layout);
  const points = countsOf(duct.inside, perLine, enterFrom);
  for (const rule of rules) {
    if (rule === "custom" || !appliesTo(rule, duct.inside.shape)) continue;
    const lines = linesByRule(duct, rule, points, enterFrom);
    if (lines && lines.length === perLine.length && lines.every((line, index) => line.points.length === perLine[index])) return { lines, byRule: true };
  }
  return { lines: withUnitWeight(evenLines(duct, perLine, enterFrom)), byRule: false };
}

/** Method 1 stands where equal area does, except that its wall limit may make several points one. */
function candidateRules(layout: LayoutRule | undefined): LayoutRule[] {
  if (!layout) return ["log_tchebycheff", "log_linear", "equal_area"];
  return layout === "method_1" ? ["method_1", "equal_area"] : [layout];
}

/** The counts that would give readings of this shape. A flat oval's last four lines are those of its ends. */
function countsOf(inside: InsideDuct, perLine: readonly number[], face: Face): PlanPoints {
  const [first = 0] = perLine;
  switch (inside.shape) {
    case "rectangular":
      return face === "top" || face === "bottom" ? { across: perLine.length, down: first } : { across: first, down: perLine.length };
    case "round":
      return { diameters: perLine.length, perDiameter: first };
    case "flat_oval":
      return { ...(perLine.length > 4 && { across: perLine.length - 4, down: first }), perDiameter: 2 * (perLine.at(-1) ?? 0) };
  }
}

/** The rule's lines, or null where the rule does not have such counts. */
function linesByRule(duct: WalledDuct, layout: LayoutRule, points: PlanPoints, enterFrom: Face): TraverseLine[] | null {
  try {
    return layoutLines(duct, { layout, points, enterFrom });
  } catch (error) {
    if (error instanceof AirflowInputError) return null;
    throw error;
  }
}

function evenLines(duct: WalledDuct, perLine: readonly number[], face: Face): TraverseLine[] {
  const { inside, wall } = duct;
  const { width } = extent(inside);
  return perLine.map((count, index) => {
    const line = inside.shape === "round" ? diameterLine(width, wall, face, (180 / perLine.length) * index) : faceLine(duct, face, (index + 0.5) / perLine.length);
    return { ...line, points: cellCentres(count).map((position) => pointAt(line, position * line.length, 1)) };
  });
}
