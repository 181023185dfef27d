import type { InsideDuct } from "../duct/insideDuct";
import { AirflowInputError } from "../errors";
import type { LayoutRule, Site } from "../types";
import { cellsOn, equalAreaCells, equalAreaPerDiameter, MOST_CELLS } from "./equalArea";
import { LOG_LINEAR_LEAST_PER_DIAMETER } from "./logLinear";
import { logTchebycheffCount } from "./logTchebycheff";
import { method1Grid, method1Minimum } from "./method1";

/** A grid, diameters, or for a flat oval both: the grid of its middle and the two halves of a diameter pair at its ends. */
export interface PointCounts {
  across?: number;
  down?: number;
  perDiameter?: number;
  diameters?: number;
}

type Shape = InsideDuct["shape"];
const RULES: Record<Shape, readonly LayoutRule[]> = {
  rectangular: ["log_tchebycheff", "equal_area", "method_1", "custom"],
  round: ["log_linear", "equal_area", "method_1", "custom"],
  flat_oval: ["log_tchebycheff", "equal_area", "custom"],
};
const SHAPE_WORDS: Record<Shape, string> = { rectangular: "rectangular", round: "round", flat_oval: "flat oval" };
const DIAMETERS = 2;

/**
 * The counts that a rule asks for at least, for a duct; null for a custom layout, which has no rule.
 * @throws {AirflowInputError} The rule is not for ducts of this shape; the fault says which are.
 */
export function minimumCounts(inside: InsideDuct, layout: LayoutRule, site?: Site): PointCounts | null {
  requireRuleForShape(inside.shape, layout);
  if (layout === "custom") return null;
  switch (inside.shape) {
    case "rectangular":
      return rectangularMinimum(inside.width, inside.height, layout, method1Minimum(inside, site));
    case "round":
      return { perDiameter: roundMinimum(inside.diameter, layout, method1Minimum(inside, site)), diameters: DIAMETERS };
    case "flat_oval":
      return flatOvalMinimum(inside.major, inside.minor, layout);
  }
}

/** Whether a rule places points in ducts of a shape. */
export const appliesTo = (layout: LayoutRule, shape: Shape): boolean => RULES[shape].includes(layout);

function requireRuleForShape(shape: Shape, layout: LayoutRule): void {
  if (appliesTo(layout, shape)) return;
  const others = RULES[shape].map((rule) => `\`${rule}\``).join(", ");
  throw new AirflowInputError({ path: ["layout"], code: "layout_not_for_shape", detail: `The layout \`${layout}\` is not for ${SHAPE_WORDS[shape]} ducts. Use one of ${others}.` });
}

function rectangularMinimum(width: number, height: number, layout: LayoutRule, method1Count: number): PointCounts {
  if (layout === "log_tchebycheff") return { across: logTchebycheffCount(width), down: logTchebycheffCount(height) };
  return layout === "equal_area" ? equalAreaCells(width, height) : method1Grid(method1Count, width, height);
}

function roundMinimum(diameter: number, layout: LayoutRule, method1Count: number): number {
  if (layout === "log_linear") return LOG_LINEAR_LEAST_PER_DIAMETER;
  return layout === "equal_area" ? equalAreaPerDiameter(diameter) : method1Count / DIAMETERS;
}

/**
 * The middle's lines stand in strips no wider than 6 in, as long as it has no more than 64 points: there is no wall at its
 * sides for a wall rule to follow.
 */
function flatOvalMinimum(major: number, minor: number, layout: LayoutRule): PointCounts {
  const middle = major - minor;
  const down = layout === "log_tchebycheff" ? logTchebycheffCount(minor) : equalAreaCells(minor, minor).down;
  const across = middle > 0 ? Math.min(cellsOn(middle), Math.floor(MOST_CELLS / down)) : 0;
  return { across, down, perDiameter: equalAreaPerDiameter(minor), diameters: DIAMETERS };
}

/** Points in all. */
export const totalOf = ({ across = 0, down = 0, perDiameter = 0, diameters = 0 }: PointCounts): number => across * down + perDiameter * diameters;

/**
 * Points that a rule asks for at least in a duct.
 * @param inside Inside dimensions in m.
 * @param site Straight lengths, which decide the count of Method 1.
 * @returns The count; null for a custom layout.
 * @throws {AirflowInputError} The rule is not for ducts of this shape.
 * @example minimumPoints({ shape: "rectangular", width: 0.6, height: 0.4 }, "log_tchebycheff") // 25
 * @see The rule's own file in this folder.
 */
export function minimumPoints(inside: InsideDuct, layout: LayoutRule, site?: Site): number | null {
  const counts = minimumCounts(inside, layout, site);
  return counts && totalOf(counts);
}
