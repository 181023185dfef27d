import type { InsideDuct } from "../../duct/insideDuct";
import { toSi } from "../../units/convert";
import type { QuantityOf } from "../../units/units";
import type { Case } from "../case";
import { forEachDigitVariant, placesOf } from "../digitVariants";
import type { Hypothesis, SlipFamily } from "../hypothesis";
import { ALL_CARRIED, dimensionsOf, isReproduced, reproduce } from "../reproduce";
import type { DimensionName } from "../slip";
import { areaOn, type Worksheet } from "../worksheet";

/** A dimension of the duct used with a slip in its digits: only such as make the area come out, or without it the airflow. */
export const dimensionDigits: SlipFamily = (one, sheet) => {
  const { duct, figures } = one;
  const telling = figures.area && !sheet.miswritten.includes("area") ? "area" : "airflow";
  if (!duct || !sheet.inside || !figures[telling] || fits(one, sheet, telling)) return [];
  return dimensionsOf(sheet.inside).flatMap(([name, inside]) => {
    const { value, unit } = (duct as unknown as Record<DimensionName, QuantityOf<"length">>)[name];
    const found: Hypothesis[] = [];
    forEachDigitVariant(value, placesOf([[value]]), (slip, used) => {
      const changed = withDimension(sheet, name, inside + toSi("length", { value: used, unit }) - toSi("length", { value, unit }));
      if (!changed || !fits(one, changed, telling)) return;
      found.push({ slips: [{ slip, figure: name, read: value, used, unit, detail: `The ${name} was measured as ${value} ${unit} and used as ${used}.` }], sheet: changed });
    });
    return found;
  });
};

function fits(one: Case, sheet: Worksheet, telling: "area" | "airflow"): boolean {
  const { area } = one.figures;
  if (telling === "area" && area) return isReproduced(areaOn(one, sheet)! / area.factor, area);
  return reproduce(one, sheet, ALL_CARRIED).some(({ figure, reproduced }) => figure === telling && reproduced);
}

/** The worksheet with another inside dimension in m; null where that is no duct. */
function withDimension(sheet: Worksheet, name: DimensionName, metres: number): Worksheet | null {
  if (!(metres > 0)) return null;
  const inside = { ...sheet.inside, [name]: metres } as InsideDuct;
  return inside.shape === "flat_oval" && inside.minor > inside.major ? null : { ...sheet, inside };
}
