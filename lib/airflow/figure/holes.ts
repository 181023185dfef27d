import type { TraverseLine } from "../layout/line";
import { toDrawing, type Frame } from "./frame";
import { ACTION, element, FONT_SIZE, RULE, strokes, text } from "./svg";

/** How far a hole's number stands off the duct. */
export const HOLE_ROOM = 26;

/** Each hole as an arrow into the duct with its number, and the way of the probe. */
export function holeMarks(frame: Frame, lines: readonly TraverseLine[]): string {
  return lines.map((line, index) => holeMark(frame, line, index + 1)).join("");
}

function holeMark(frame: Frame, line: TraverseLine, number: number): string {
  const start = toDrawing(frame, line.start);
  // Upwards in the duct is down in the drawing's coordinates.
  const [dx, dy] = [line.direction.x, -line.direction.y];
  const beyond = line.wall * frame.scale;
  const spot = (off: number, aside = 0): [number, number] => [start.x - dx * (beyond + off) - dy * aside, start.y - dy * (beyond + off) + dx * aside];
  const end: [number, number] = [start.x + dx * line.length * frame.scale, start.y + dy * line.length * frame.scale];
  const [x, y] = spot(16);
  return (
    strokes([[spot(1), end]], { stroke: RULE, "stroke-dasharray": "2 3" }) +
    element("path", { d: `M${[spot(1), spot(8, 3.5), spot(8, -3.5)].map((corner) => corner.map((value) => Math.round(value * 100) / 100).join(" ")).join("L")}z`, fill: ACTION }) +
    text(String(number), { x, y, dy: "0.35em", "text-anchor": "middle", "font-weight": 600, "font-size": FONT_SIZE, fill: ACTION })
  );
}
