import { wallDistance } from "../layout/chord";
import type { Place } from "../layout/line";
import { cividis } from "./cividis";
import { toDrawing, type Frame } from "./frame";
import { shareOf, type DrawnReading, type ReadingModel } from "./readingModel";
import { CARD, element, INK, MUTED, RUST, strokes } from "./svg";

const LARGEST = 6;
/** Smaller ones would show no colour; points as near as this may touch. */
const SMALLEST = 2.5;
/** From a point's edge to the outside of the ring round a suspected slip. */
export const RING_GAP = 4;

/** A radius at which points touch neither each other nor reach over the wall. */
export function pointRadius(frame: Frame, readings: readonly DrawnReading[]): number {
  const spots = readings.map((reading) => ({ ...toDrawing(frame, reading), wall: wallDistance(frame.inside, reading) * frame.scale }));
  let room = LARGEST;
  for (const [index, one] of spots.entries()) {
    room = Math.min(room, one.wall);
    for (let other = index + 1; other < spots.length; other += 1) room = Math.min(room, 0.42 * Math.hypot(one.x - spots[other]!.x, one.y - spots[other]!.y));
  }
  return Math.max(SMALLEST, room);
}

/** A reading's point: filled by its colour, crossed where it could not be read, ringed where a slip is suspected. */
export function pointMark({ x, y }: Place, { reading, coloured, suspected }: DrawnReading, range: ReadingModel["range"], radius: number): string {
  if (reading === null) {
    const arm = radius * 0.7;
    return strokes([[[x - arm, y - arm], [x + arm, y + arm]], [[x - arm, y + arm], [x + arm, y - arm]]], { stroke: MUTED, "stroke-width": 1.5 });
  }
  const fill = coloured === null || !range ? CARD : cividis(shareOf(coloured, range));
  const ring = suspected ? element("circle", { cx: x, cy: y, r: radius + RING_GAP - 1, fill: "none", stroke: RUST, "stroke-width": 2 }) : "";
  return ring + element("circle", { cx: x, cy: y, r: radius, fill, stroke: INK, "stroke-width": 0.75 });
}
