import type { FigurePoint } from "./CrossSection";
import type { DuctOutline } from "./ductOutline";

/** Radius of the ring around a suspected slip, in the drawing's units. */
export const RING = 8.5;
/** Rows closer than this leave no room for readings between them. */
export const ROW_GAP = 24;
/** From a point's centre to the foot of digits below it, and to their foot when they stand above. */
const BELOW = 13.9;
const ABOVE = -6.5;
/** Fraction of the width within which digits centred on a point would cross the wall. */
const NEAR_WALL = 0.06;
/** Kept between digits and the wall. */
const CLEAR = 3;
/** More, where a ring stands between. */
const PAST_RING = RING - 3;

export interface LabelPlace {
  x: number;
  y: number;
  textAnchor: "start" | "middle" | "end";
}

/**
 * Where a point's reading is written, from the point's centre. In a rectangular duct below the point, or above it where
 * the wall is too near; on an upright diameter beside it; on a level one above and below in turn, since points crowd
 * near the wall.
 *
 * @param height - Inside height of the duct, in the drawing's units.
 */
export function placeLabel(point: FigurePoint, duct: DuctOutline, height: number): LabelPlace {
  const past = point.suspected ? PAST_RING : 0;
  const below: LabelPlace = { x: 0, y: BELOW + past, textAnchor: "middle" };
  const above: LabelPlace = { x: 0, y: ABOVE - past, textAnchor: "middle" };
  if (duct.shape === "rectangular") return point.y * height + below.y + CLEAR > height ? above : below;
  if (point.x === 0.5) return { x: 8 + past, y: 3.7, textAnchor: "start" };
  const level = point.point % 2 === 1 ? above : below;
  if (point.x < NEAR_WALL) return { ...level, x: -4.5, textAnchor: "start" };
  if (point.x > 1 - NEAR_WALL) return { ...level, x: 4.5, textAnchor: "end" };
  return level;
}

/** The smallest distance between rows of points, as a fraction of the height; 1 where there is a single row. */
export function rowGap(points: FigurePoint[]): number {
  const rows = [...new Set(points.map(({ y }) => y))].sort((a, b) => a - b);
  return Math.min(1, ...rows.slice(1).map((row, index) => row - (rows[index] ?? 0)));
}
