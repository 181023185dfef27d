import { extent, type WalledDuct } from "../layout/chord";
import type { Place } from "../layout/line";

/** Where a duct stands in a drawing. Metres count from the left and the bottom of the inside, drawing units from the top. */
export interface Frame extends WalledDuct {
  /** Drawing units to a metre. */
  scale: number;
  /** Left and top of the inside, and its size, in drawing units. */
  left: number;
  top: number;
  width: number;
  height: number;
  /** Wall and lining, to scale. */
  rim: number;
}

export type Margins = Record<"top" | "right" | "bottom" | "left", number>;

/**
 * Fits a duct with its wall into a drawing: as large as the width allows, no higher than the height, in the middle.
 * @param width Of the whole drawing. @param height Of the duct at most.
 */
export function frameIn(duct: WalledDuct, width: number, height: number, margins: Margins): Frame {
  const inside = extent(duct.inside);
  const room = width - margins.left - margins.right;
  const scale = Math.min(room / (inside.width + 2 * duct.wall), height / (inside.height + 2 * duct.wall));
  const rim = duct.wall * scale;
  const [w, h] = [inside.width * scale, inside.height * scale];
  return { ...duct, scale, rim, width: w, height: h, left: margins.left + (room - w) / 2, top: margins.top + rim };
}

/** A place in the cross-section in drawing units. */
export const toDrawing = ({ left, top, height, scale }: Frame, { x, y }: Place): Place => ({ x: left + x * scale, y: top + height - y * scale });

/** A place in the drawing in metres of the cross-section. */
export const toDuct = ({ left, top, height, scale }: Frame, { x, y }: Place): Place => ({ x: (x - left) / scale, y: (top + height - y) / scale });

/** Edges of the duct's outside in drawing units. */
export const outside = ({ left, top, width, height, rim }: Frame) => ({ left: left - rim, right: left + width + rim, top: top - rim, bottom: top + height + rim });
