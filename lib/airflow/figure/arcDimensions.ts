import { outward } from "../layout/chord";
import type { TraverseLine } from "../layout/line";
import type { UnitSystem } from "../units/units";
import { toDrawing, type Frame } from "./frame";
import { HOLE_ROOM } from "./holes";
import { tape } from "./measures";
import { EDGE, element, strokes, text } from "./svg";

/** Room that dimensions round a duct take. */
export const ARC_ROOM = HOLE_ROOM + 22;

/** Distances round the outside of a round duct, from hole 1 to each of the others, one farther out than the other. */
export function arcDimensions(frame: Frame, lines: readonly TraverseLine[], system: UnitSystem): string {
  const radius = frame.height / 2 + frame.rim;
  const centre = toDrawing(frame, { x: frame.height / frame.scale / 2, y: frame.height / frame.scale / 2 });
  const first = lines[0]?.angle ?? 0;
  const spot = (degrees: number, off: number): [number, number] => {
    const out = outward(degrees);
    return [centre.x + out.x * (radius + off), centre.y - out.y * (radius + off)];
  };
  return lines
    .slice(1)
    .map(({ alongOutside, edge }) => {
      const sense = edge === "hole_1_clockwise" ? 1 : -1;
      const sweep = (alongOutside / (radius / frame.scale)) * (180 / Math.PI);
      return arc(spot, radius, first, sense, sweep, tape(alongOutside, system));
    })
    .join("");
}

function arc(spot: (degrees: number, off: number) => [number, number], radius: number, from: number, sense: number, sweep: number, words: string): string {
  const off = HOLE_ROOM;
  const r = Math.round((radius + off) * 100) / 100;
  const [start, end] = [spot(from, off), spot(from + sense * sweep, off)];
  const [x, y] = spot(from + (sense * sweep) / 2, off + 6);
  const path = `M${start.map((value) => value.toFixed(2)).join(" ")}A${r} ${r} 0 ${sweep > 180 ? 1 : 0} ${sense > 0 ? 1 : 0} ${end.map((value) => value.toFixed(2)).join(" ")}`;
  const ticks = [from, from + sense * sweep].map((degrees) => [spot(degrees, off - 4), spot(degrees, off + 4)]);
  const middle = (((from + (sense * sweep) / 2) % 360) + 360) % 360;
  return element("path", { d: path, fill: "none", stroke: EDGE }) + strokes(ticks, { stroke: EDGE }) + text(words, { x, y, dy: "0.35em", "text-anchor": middle < 180 ? "start" : "end" });
}
