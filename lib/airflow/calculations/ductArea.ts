import { area, AREA_EQUATION } from "../duct/area";
import { hydraulicDiameter } from "../duct/hydraulicDiameter";
import { insideDuct, wallThickness, type InsideDuct } from "../duct/insideDuct";
import { perimeter, PERIMETER_EQUATION } from "../duct/perimeter";
import type { AnswerOptions, Duct } from "../types";
import { inAnswerUnits } from "../units/convert";
import type { QuantityOf, UnitSystem } from "../units/units";
import type { Working, WorkingStep } from "../working/working";
import { resolveOptions, workingPart } from "./options";

export interface DuctAreaInput extends AnswerOptions {
  duct: Duct;
}

/** Inside dimensions as an answer gives them. */
export type InsideAnswer =
  | { shape: "rectangular"; width: QuantityOf<"length">; height: QuantityOf<"length"> }
  | { shape: "round"; diameter: QuantityOf<"length"> }
  | { shape: "flat_oval"; major: QuantityOf<"length">; minor: QuantityOf<"length"> };

export interface DuctAreaAnswer {
  inside: InsideAnswer;
  area: QuantityOf<"area">;
  perimeter: QuantityOf<"length">;
  hydraulicDiameter: QuantityOf<"length">;
  working?: WorkingStep[];
}

/**
 * Inside dimensions, area, perimeter and hydraulic diameter of a duct.
 * @param input As the API takes it.
 * @returns As the API gives it, in the units asked for.
 * @throws {AirflowInputError} A dimension that is not above 0, outside or inside.
 * @example ductArea({ duct: { shape: "rectangular", measured: "inside", width: { value: 500, unit: "mm" }, height: { value: 400, unit: "mm" } }, units: "si" }).area // { value: 0.2, unit: "m2" }
 */
export function ductArea(input: DuctAreaInput): DuctAreaAnswer {
  const { system, working } = resolveOptions(input);
  const inside = insideDuct(input.duct);
  if (working) addDuctWorking(working, input.duct, inside, system);
  return {
    inside: insideAnswer(inside, system),
    area: inAnswerUnits("area", area(inside), system),
    perimeter: inAnswerUnits("length", perimeter(inside), system),
    hydraulicDiameter: inAnswerUnits("length", hydraulicDiameter(inside), system),
    ...workingPart(working),
  };
}

/** Inside dimensions in the units of the answer. */
export function insideAnswer(inside: InsideDuct, system: UnitSystem): InsideAnswer {
  const length = (metres: number): QuantityOf<"length"> => inAnswerUnits("length", metres, system);
  switch (inside.shape) {
    case "rectangular":
      return { shape: "rectangular", width: length(inside.width), height: length(inside.height) };
    case "round":
      return { shape: "round", diameter: length(inside.diameter) };
    case "flat_oval":
      return { shape: "flat_oval", major: length(inside.major), minor: length(inside.minor) };
  }
}

/** A shape's dimensions with the symbols its equations use. */
function dimensionsOf(inside: InsideDuct): [symbol: string, name: string, metres: number][] {
  switch (inside.shape) {
    case "rectangular":
      return [["w", "width", inside.width], ["h", "height", inside.height]];
    case "round":
      return [["D", "diameter", inside.diameter]];
    case "flat_oval":
      return [["a", "major axis", inside.major], ["b", "minor axis", inside.minor]];
  }
}

/** The steps from the measured duct to its area and hydraulic diameter. */
export function addDuctWorking(working: Working, duct: Duct, inside: InsideDuct, system: UnitSystem): void {
  const length = (metres: number): QuantityOf<"length"> => inAnswerUnits("length", metres, system);
  const dimensions = dimensionsOf(inside);
  if (duct.measured === "outside") {
    const wall = wallThickness(duct);
    for (const [symbol, name, metres] of dimensions) {
      working.add({
        step: `Inside ${name}`,
        equation: `${symbol} = ${symbol}_outside − 2 t`,
        inputs: { [`${symbol}_outside`]: length(metres + 2 * wall), t: length(wall) },
        value: length(metres),
        source: "Geometry: wall and lining, t, on both sides",
      });
    }
  }
  const inputs = Object.fromEntries(dimensions.map(([symbol, , metres]) => [symbol, length(metres)]));
  const areaValue = inAnswerUnits("area", area(inside), system);
  const perimeterValue = length(perimeter(inside));
  working.add({ step: "Area", equation: AREA_EQUATION[inside.shape], inputs, value: areaValue, source: "Plane geometry" });
  working.add({ step: "Perimeter", equation: PERIMETER_EQUATION[inside.shape], inputs, value: perimeterValue, source: "Plane geometry" });
  working.add({
    step: "Hydraulic diameter",
    equation: "D_h = 4 A / P",
    inputs: { A: areaValue, P: perimeterValue },
    value: length(hydraulicDiameter(inside)),
    source: "40 CFR 60 App. A-1, Method 1, equation 1-1, for rectangles",
  });
}
