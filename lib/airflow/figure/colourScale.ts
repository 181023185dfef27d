import type { Block } from "./blocks";
import { cividis } from "./cividis";
import type { ReadingModel } from "./readingModel";
import { element, INK, MUTED, text } from "./svg";
import { significant, UNIT_SYMBOLS } from "./writeReadings";

const STEPS = 32;
const WIDEST = 320;

/** What the colours stand for: a bar from the lowest to the highest, with both written below it. Steps need no identifiers, which could clash on a page with several drawings. */
export function colourScale({ range, colour }: ReadingModel, room: number): Block {
  if (!range) return { svg: "", height: 0 };
  const width = Math.min(WIDEST, room - 40);
  const left = (room - width) / 2;
  const step = width / STEPS;
  const bars = Array.from({ length: STEPS }, (_, index) => element("rect", { x: left + index * step, y: 4, width: step + 0.5, height: 7, fill: cividis(index / (STEPS - 1)) }));
  const unit = colour.unit ? `, ${UNIT_SYMBOLS[colour.unit] ?? colour.unit}` : "";
  const svg = [
    ...bars,
    element("rect", { x: left, y: 4, width, height: 7, fill: "none", stroke: INK, "stroke-width": 0.75 }),
    text(significant(range.low), { x: left, y: 24 }),
    text(`${colour.quantity}${unit}`, { x: room / 2, y: 24, "text-anchor": "middle", fill: MUTED }),
    text(significant(range.high), { x: left + width, y: 24, "text-anchor": "end" }),
  ];
  return { svg: svg.join(""), height: 28 };
}
