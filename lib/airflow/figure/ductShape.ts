import type { Frame } from "./frame";
import { CARD, EDGE, element, INK, INSET } from "./svg";

/** The duct to scale: its outside, what lies between, and its inside. */
export function ductShape(frame: Frame): string {
  const inner = element("path", { d: outline(frame, 0), fill: CARD, stroke: INK, "stroke-width": 1.5 });
  if (frame.rim === 0) return inner;
  return (
    element("path", { d: outline(frame, frame.rim), fill: INSET, stroke: INK, "stroke-width": 1 }) +
    element("path", { d: outline(frame, frame.rim / 2), fill: "none", stroke: EDGE, "stroke-width": 1, "stroke-dasharray": "1 4", "stroke-linecap": "round" }) +
    inner
  );
}

/** The inside's outline, or one that runs so far outside it. Corners are square; round and flat oval ends are half circles. */
function outline({ inside, left, top, width, height }: Frame, grown: number): string {
  const [x, y, w, h] = [left - grown, top - grown, width + 2 * grown, height + 2 * grown].map((value) => Math.round(value * 100) / 100) as [number, number, number, number];
  if (inside.shape === "rectangular") return `M${x} ${y}h${w}v${h}h${-w}z`;
  const r = h / 2;
  return `M${x + r} ${y}h${w - h}a${r} ${r} 0 0 1 0 ${h}h${h - w}a${r} ${r} 0 0 1 0 ${-h}z`;
}
