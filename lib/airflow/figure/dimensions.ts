import type { Face } from "../layout/line";
import { outside, type Frame } from "./frame";
import { EDGE, element, FONT_SIZE, INK, monoWidth, strokes, text } from "./svg";

/** A direction along a side of the duct and one away from it, in drawing units. */
interface Side {
  /** The drawing's place of a spot so far along and so far off the outside face. */
  at: (along: number, off: number) => [number, number];
  upright: boolean;
}

function sideOf(frame: Frame, side: Face): Side {
  const edges = outside(frame);
  switch (side) {
    case "top":
      return { at: (along, off) => [along, edges.top - off], upright: false };
    case "bottom":
      return { at: (along, off) => [along, edges.bottom + off], upright: false };
    case "left":
      return { at: (along, off) => [edges.left - off, along], upright: true };
    case "right":
      return { at: (along, off) => [edges.right + off, along], upright: true };
  }
}

/** A slanted tick through a spot, as drawings have it. */
const tick = ([x, y]: [number, number]): [number, number][] => [[x - 3, y + 3], [x + 3, y - 3]];

/** How far the inside dimension stands off the duct, and how much room it takes. */
export const DIMENSION_ROOM = 36;

/** A dimension between the inside faces, on a side of the duct; its figure interrupts the line. */
export function insideDimension(frame: Frame, side: Face, words: string): string {
  const { at, upright } = sideOf(frame, side);
  const [from, to] = upright ? [frame.top, frame.top + frame.height] : [frame.left, frame.left + frame.width];
  const middle = (from + to) / 2;
  const half = monoWidth(words) / 2 + 4;
  const off = 18;
  // The figure stands beside a line that is too short to be interrupted.
  const fits = to - from > 2 * half + 12;
  const line = fits ? [[at(from, off), at(middle - half, off)], [at(middle + half, off), at(to, off)]] : [[at(from, off), at(to, off)]];
  const [x, y] = at(middle, fits ? off : off + 10);
  return (
    strokes([...line, [at(from, 5), at(from, off + 5)], [at(to, 5), at(to, off + 5)], tick(at(from, off)), tick(at(to, off))], { stroke: EDGE }) +
    text(words, { x, y, dy: "0.35em", "text-anchor": "middle", transform: upright ? `rotate(-90 ${Math.round(x)} ${Math.round(y)})` : undefined })
  );
}

/** A spot along a side, with the words that stand beside it. */
export interface Station {
  along: number;
  words: string;
}

interface RunningDimension {
  side: Face;
  /** Where measuring begins, in drawing units along the side. */
  origin: number;
  stations: readonly Station[];
  /** How far off the outside face the line runs. */
  off: number;
}

/** Room that a running dimension's words need beyond its line. */
export function runningRoom(stations: readonly Station[], upright: boolean): number {
  const widest = Math.max(0, ...stations.map(({ words }) => monoWidth(words)));
  return upright || turns(stations) ? widest + 10 : FONT_SIZE + 8;
}

/** Whether words side by side would touch, so that they are turned. */
function turns(stations: readonly Station[]): boolean {
  return stations.some(({ along, words }, index) => index > 0 && along - stations[index - 1]!.along < (monoWidth(words) + monoWidth(stations[index - 1]!.words)) / 2 + 5);
}

/** Running dimensions: one line from a common origin, a tick and a figure at each spot. Figures that would touch are left out. */
export function runningDimension(frame: Frame, { side, origin, stations, off }: RunningDimension): string {
  const { at, upright } = sideOf(frame, side);
  const ordered = [...stations].sort((one, other) => one.along - other.along);
  const turned = !upright && turns(ordered);
  const ends = [origin, ...ordered.map(({ along }) => along)];
  const [ox, oy] = at(origin, off);
  let lastWritten = -Infinity;
  const words = ordered.map(({ along, words: figure }) => {
    if ((upright || turned) && along - lastWritten < FONT_SIZE + 1) return "";
    lastWritten = along;
    return stationWords(side, at(along, off + 6), figure, turned);
  });
  return (
    strokes([[at(Math.min(...ends), off), at(Math.max(...ends), off)], [at(origin, 3), at(origin, off)], ...ordered.map(({ along }) => tick(at(along, off)))], { stroke: EDGE }) +
    element("circle", { cx: ox, cy: oy, r: 2.5, fill: INK }) +
    words.join("")
  );
}

function stationWords(side: Face, [x, y]: [number, number], words: string, turned: boolean): string {
  if (side === "left" || side === "right") return text(words, { x, y, dy: "0.35em", "text-anchor": side === "left" ? "end" : "start" });
  if (turned) return text(words, { x, y, dy: "0.35em", "text-anchor": side === "top" ? "start" : "end", transform: `rotate(-90 ${Math.round(x * 100) / 100} ${Math.round(y * 100) / 100})` });
  return text(words, { x, y, dy: side === "top" ? 0 : "0.75em", "text-anchor": "middle" });
}
