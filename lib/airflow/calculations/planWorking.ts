import { extent } from "../layout/chord";
import type { TraverseLine } from "../layout/line";
import type { TraversePlan } from "../layout/plan";
import type { Duct } from "../types";
import { inAnswerUnits } from "../units/convert";
import type { QuantityOf, UnitSystem } from "../units/units";
import type { Working } from "../working/working";
import { ratio } from "./airAnswer";
import { addDuctWorking } from "./ductArea";

/** The steps from the duct to its holes and depths. Lines that repeat the depths of an earlier one are not repeated. */
export function addPlanWorking(working: Working, duct: Duct, plan: TraversePlan, system: UnitSystem): void {
  addDuctWorking(working, duct, plan.inside, system);
  const shown = new Set<string>();
  for (const [index, line] of plan.lines.entries()) {
    addHole(working, plan, line, index + 1, system);
    const depths = line.points.map(({ depth }) => depth.toPrecision(9)).join(" ");
    if (!shown.has(depths)) addDepths(working, plan, line, index + 1, system);
    shown.add(depths);
  }
  addReach(working, plan, system);
}

function addHole(working: Working, { inside, wall, source }: TraversePlan, line: TraverseLine, hole: number, system: UnitSystem): void {
  const length = (metres: number): QuantityOf<"length"> => inAnswerUnits("length", metres, system);
  if (line.angle === null) {
    const { width, height } = extent(inside);
    const face = line.edge === "left" ? width : height;
    working.add({ step: `Hole ${hole}: on the outside, from the ${line.edge}`, equation: "s_outside = f W + t", inputs: { f: ratio(line.along / face), W: length(face), t: length(wall) }, value: length(line.alongOutside), source });
    return;
  }
  const radius = (inside.shape === "round" ? inside.diameter : line.length * 2) / 2;
  working.add({
    step: `Hole ${hole}: along the outside`,
    equation: "s_outside = (r + t) θ",
    inputs: { r: length(radius), t: length(wall), "θ in radians": ratio(line.along / radius) },
    value: length(line.alongOutside),
    source: "Geometry: length of an arc",
  });
}

function addDepths(working: Working, { inside, source }: TraversePlan, line: TraverseLine, hole: number, system: UnitSystem): void {
  const length = (metres: number): QuantityOf<"length"> => inAnswerUnits("length", metres, system);
  // A radius in a flat oval's end is half of the diameter that the rule divides.
  const divided = inside.shape === "flat_oval" && line.angle !== null ? 2 * line.length : line.length;
  for (const [index, { depth }] of line.points.entries()) {
    working.add({
      step: `Hole ${hole}, point ${index + 1}: insertion depth from the outside`,
      equation: "y_outside = f L + t",
      inputs: { f: ratio(depth / divided), L: length(divided), t: length(line.wall) },
      value: length(line.wall + depth),
      source,
    });
  }
}

function addReach(working: Working, { probeLength, points }: TraversePlan, system: UnitSystem): void {
  working.add({
    step: "Probe length needed",
    equation: "L_probe = max y_outside",
    inputs: { n: ratio(points) },
    value: inAnswerUnits("length", probeLength, system),
    source: "Geometry of the plan",
  });
}
