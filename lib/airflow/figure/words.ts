import type { TraverseLine } from "../layout/line";
import type { LayoutRule } from "../types";
import type { UnitSystem } from "../units/units";
import { tape, tapeUnit, tapeWithUnit } from "./measures";

export const LAYOUT_WORDS: Record<LayoutRule, string> = {
  log_tchebycheff: "log-Tchebycheff",
  log_linear: "log-linear",
  equal_area: "equal area",
  method_1: "Method 1",
  custom: "custom layout",
};

/** From where a hole is measured, as a sentence goes on. */
const EDGE_WORDS: Record<TraverseLine["edge"], string> = {
  left: "from the left edge",
  top: "from the top edge",
  hole_1_clockwise: "round the outside from hole 1, clockwise",
  hole_1_anticlockwise: "round the outside from hole 1, anticlockwise",
  middle_of_end: "round the outside from the middle of the end",
};

/** Where a hole is, in words: "top face, 2.78 in from the left edge". */
export function holeWords(line: TraverseLine, number: number, system: UnitSystem): string {
  const at = number === 1 && line.edge === "hole_1_clockwise" ? "start of the measuring" : `${tapeWithUnit(line.alongOutside, system)} ${EDGE_WORDS[line.edge]}`;
  return line.angle === null ? `${line.face} face, ${at}` : `at ${Math.round(line.angle)}° clockwise from the top, ${at}`;
}

/** A plan in words, hole by hole, for those who do not see the drawing. */
export function planWords(lines: readonly TraverseLine[], system: UnitSystem): string {
  return lines
    .map((line, index) => {
      const depths = line.points.map(({ depth }) => tape(line.wall + depth, system)).join(", ");
      return `Hole ${index + 1}: ${holeWords(line, index + 1, system)}; depths from the outside ${depths} ${tapeUnit(system)}.`;
    })
    .join(" ");
}
