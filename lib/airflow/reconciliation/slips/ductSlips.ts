import { wallThickness, type InsideDuct } from "../../duct/insideDuct";
import type { Duct } from "../../types";
import { fromSi } from "../../units/convert";
import type { LengthUnit } from "../../units/units";
import { methodSlip, type Hypothesis, type SlipFamily } from "../hypothesis";
import { dimensionsOf } from "../reproduce";
import type { DimensionName } from "../slip";

const unitOf = (duct: Duct): LengthUnit => (duct.shape === "rectangular" ? duct.width : duct.shape === "round" ? duct.diameter : duct.major).unit;

const enlarged = (inside: InsideDuct, by: number, only?: DimensionName): InsideDuct =>
  ({ ...inside, ...Object.fromEntries(dimensionsOf(inside).map(([name, metres]) => [name, only && only !== name ? metres : metres + by])) }) as InsideDuct;

/** Outside dimensions taken as inside, on all axes or on one; wall and lining subtracted once instead of twice. */
export const wallSlips: SlipFamily = (one, sheet) => {
  const { duct } = one;
  const { inside } = sheet;
  const wall = duct ? wallThickness(duct) : 0;
  if (!duct || !inside || !(wall > 0)) return [];
  const unit = unitOf(duct);
  const dimensions = dimensionsOf(inside);
  const onOneAxis = dimensions.map(([name, metres]): Hypothesis => {
    const [read, used] = [metres, metres + 2 * wall].map((length) => fromSi("length", length, unit).value) as [number, number];
    const detail = `The outside ${name}, ${used} ${unit}, was used for the inside one, ${read} ${unit}.`;
    return { slips: [{ slip: "outside_for_inside", figure: name, read, used, unit, detail }], sheet: { ...sheet, inside: enlarged(inside, 2 * wall, name) } };
  });
  return [
    methodSlip(one, sheet, { ...sheet, inside: enlarged(inside, 2 * wall) }, "outside_for_inside", "area", "Outside dimensions were used for inside ones."),
    methodSlip(one, sheet, { ...sheet, inside: enlarged(inside, wall) }, "wall_subtracted_once", "area", "Wall and lining were subtracted once from each dimension instead of twice."),
    ...(dimensions.length > 1 ? onOneAxis : []),
  ];
};

/** A round duct's area with the diameter for the radius, or the radius for the diameter. */
export const radiusForDiameter: SlipFamily = (one, sheet) => {
  if (sheet.inside?.shape !== "round") return [];
  const suppose = (factor: number, detail: string): Hypothesis => methodSlip(one, sheet, { ...sheet, areaFactor: sheet.areaFactor * factor }, "radius_for_diameter", "area", detail);
  return [suppose(4, "The diameter was used as the radius: the area is four times too large."), suppose(1 / 4, "The radius was used as the diameter: the area is a quarter of what it should be.")];
};

/** Square units in one of the larger square unit, and the linear factor that is used for it by mistake: 144 in² in a ft², or 12. */
const CONVERSIONS: Partial<Record<LengthUnit, [squared: number, linear: number]>> = { in: [144, 12], mm: [1_000_000, 1000], cm: [10_000, 100] };

/** The change from in² to ft² (or mm² or cm² to m²) forgotten, or done with the linear factor. */
export const areaConversion: SlipFamily = (one, sheet) => {
  const conversion = one.duct && CONVERSIONS[unitOf(one.duct)];
  if (!conversion) return [];
  const [squared, linear] = conversion;
  const suppose = (divisor: number, detail: string): Hypothesis =>
    methodSlip(one, sheet, { ...sheet, areaFactor: (sheet.areaFactor * squared) / divisor }, "area_conversion", "area", detail);
  return [suppose(1, `The area was not divided by ${squared}.`), suppose(linear, `The area was divided by ${linear} instead of ${squared}.`)];
};
