import type { LayoutRule } from "../types";
import { faceLine, type WalledDuct } from "./chord";
import { cellCentres } from "./equalArea";
import { pointAt, type Face, type TraverseLine } from "./line";
import { LOG_TCHEBYCHEFF } from "./logTchebycheff";
import { keepOffWall, wallLimit } from "./method1";
import type { PointCounts } from "./minimumPoints";

/** Positions along one side of a rectangle by its rule. Method 1 and equal area take the middle of equal cells. */
const sidePositions = (layout: LayoutRule, count: number): readonly number[] => (layout === "log_tchebycheff" ? LOG_TCHEBYCHEFF[count]! : cellCentres(count));

/** The grid of a rectangular duct: a hole for each point along the face, and behind each the points of the other side. */
export function rectangularLines(duct: WalledDuct, layout: LayoutRule, { across, down }: Required<PointCounts>, face: Face, probeDiameter: number): TraverseLine[] {
  const upright = face === "top" || face === "bottom";
  const alongFace = sidePositions(layout, upright ? across : down);
  const intoDuct = sidePositions(layout, upright ? down : across);
  return alongFace.map((at) => {
    const line = faceLine(duct, face, at);
    const depths = intoDuct.map((position) => position * line.length);
    const kept = layout === "method_1" ? keepOffWall(depths, line.length, wallLimit(duct.inside, probeDiameter)) : depths.map((depth) => ({ depth, standsFor: 1 }));
    return { ...line, points: kept.map(({ depth, standsFor }) => pointAt(line, depth, 1, standsFor)) };
  });
}
