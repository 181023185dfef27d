import { wallDistance } from "../layout/chord";
import type { TraverseLine } from "../layout/line";
import { toDrawing, type Frame } from "./frame";
import { placeLabels } from "./placeLabels";
import { CARD, element, INK, text } from "./svg";

const DOT = 2.5;
/** A ring of this radius holds a number of up to two digits. */
const RING = 8;
const SMALLEST_RING = 6.5;
const NUMBER_SIZE = 9.5;

interface Spot {
  x: number;
  y: number;
  number: string;
  /** Radius that keeps clear of the other points and the wall. */
  room: number;
}

/** The points of each line, numbered from the hole in the order to read them: in rings where all of a line have room, else beside dots. */
export function numberedPoints(frame: Frame, lines: readonly TraverseLine[]): string {
  const spots = spotsOf(frame, lines);
  const ringed = spots.filter((line) => Math.min(...line.map(({ room }) => room)) >= SMALLEST_RING);
  const dotted = spots.filter((line) => !ringed.includes(line)).flat();
  const rings = ringed.map((line) => line.map((spot) => ring(spot, Math.min(RING, ...line.map(({ room }) => room)))).join(""));
  return rings.join("") + dots(frame, dotted, ringed.flat());
}

function spotsOf(frame: Frame, lines: readonly TraverseLine[]): Spot[][] {
  const places = lines.map(({ points }) => points.map((point) => ({ ...toDrawing(frame, point), wall: wallDistance(frame.inside, point) * frame.scale })));
  const all = places.flat();
  return places.map((line) =>
    line.map((spot, index) => {
      const nearest = all.reduce((least, other) => (other === spot ? least : Math.min(least, Math.hypot(spot.x - other.x, spot.y - other.y))), Infinity);
      return { x: spot.x, y: spot.y, number: String(index + 1), room: Math.min(nearest / 2, spot.wall) - 1 };
    }),
  );
}

const ring = ({ x, y, number }: Spot, radius: number): string =>
  element("circle", { cx: x, cy: y, r: radius, fill: CARD, stroke: INK }) + text(number, { x, y, dy: "0.35em", "text-anchor": "middle", "font-size": (NUMBER_SIZE * radius) / RING });

function dots(frame: Frame, spots: readonly Spot[], rings: readonly Spot[]): string {
  const labels = spots.map(({ x, y, number }) => ({ words: number, at: { x, y }, clear: DOT + 1 }));
  const around = rings.map(({ x, y }) => ({ words: "", at: { x, y }, clear: RING }));
  const numbers = placeLabels(frame, [...labels, ...around], NUMBER_SIZE).slice(0, labels.length);
  return (
    spots.map(({ x, y }) => element("circle", { cx: x, cy: y, r: DOT, fill: INK })).join("") +
    numbers.map((label) => (label ? text(label.words, { x: label.x, y: label.y, "text-anchor": "middle", "font-size": NUMBER_SIZE, stroke: CARD, "stroke-width": 2.5, "paint-order": "stroke" }) : "")).join("")
  );
}
