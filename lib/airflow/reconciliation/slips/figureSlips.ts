import { UNITS, type QuantityKind } from "../../units/units";
import type { Case } from "../case";
import { forEachDigitVariant, placesOf, type DigitSlip } from "../digitVariants";
import type { Hypothesis, SlipFamily } from "../hypothesis";
import { inOrder } from "../reported";
import { isReproduced, NOTHING_CARRIED, reproduce } from "../reproduce";

/** The slip that leads from the other number back to the first. */
const REVERSED: Record<DigitSlip, DigitSlip> = {
  digit_changed: "digit_changed",
  digits_swapped: "digits_swapped",
  digit_dropped: "digit_added",
  digit_added: "digit_dropped",
  decimal_moved: "decimal_moved",
};

/** A figure written down with a slip in its digits; what follows may go on with the right one or with the wrong one. */
export const figureDigits: SlipFamily = (one, sheet) => {
  const worked = reproduce(one, sheet, NOTHING_CARRIED);
  return inOrder(one.figures).flatMap((reported, index) => {
    const { figure, value, unit } = reported;
    const right = worked[index]!;
    if (right.reproduced || figure === "count") return [];
    const found: Hypothesis[] = [];
    forEachDigitVariant(value, placesOf([[value]]), (slip, read) => {
      if (!isReproduced(right.value, { ...reported, value: read })) return;
      const detail = `The ${figure} comes to ${read} and was written as ${value}.`;
      found.push({ slips: [{ slip: REVERSED[slip], figure, read, used: value, unit, detail }], sheet: { ...sheet, miswritten: [...sheet.miswritten, figure] } });
    });
    return found;
  });
};

/** A figure rounded to whole units although it has fewer than three digits: 7.51 ft² written as 8. */
export const figureCoarse: SlipFamily = (one, sheet) => {
  const worked = reproduce(one, sheet, NOTHING_CARRIED);
  return inOrder(one.figures).flatMap(({ figure, value, unit }, index): Hypothesis[] => {
    const right = worked[index]!;
    if (right.reproduced || figure === "count" || !Number.isInteger(value) || Math.round(right.value) !== value) return [];
    const detail = `The ${figure}, ${right.value}, was rounded to ${value} before it was used further.`;
    return [{ slips: [{ slip: "rounded_early", figure, read: right.value, used: value, unit, detail }], sheet: { ...sheet, miswritten: [...sheet.miswritten, figure] } }];
  });
};

/** A figure that would be right in another unit of its quantity. */
export const figureUnit: SlipFamily = (one, sheet) => {
  const worked = reproduce(one, sheet, NOTHING_CARRIED);
  return inOrder(one.figures).flatMap((reported, index) => {
    const { figure, value, unit, factor } = reported;
    const kind = unitKind(one, figure);
    const right = worked[index]!;
    if (!kind || right.reproduced) return [];
    return Object.entries(UNITS[kind] as Record<string, { factor: number }>).flatMap(([other, definition]): Hypothesis[] => {
      const inOther = (right.value * factor) / definition.factor;
      if (other === unit || !isReproduced(inOther, reported)) return [];
      const detail = `The ${figure} is ${right.value} ${unit}; ${value} would be right in ${other}.`;
      return [{ slips: [{ slip: "unit_confused", figure, read: right.value, used: value, unit, detail }], sheet: { ...sheet, miswritten: [...sheet.miswritten, figure] } }];
    });
  });
};

function unitKind(one: Case, figure: string): QuantityKind | null {
  if (figure === "airflow") return "airflow";
  if (figure === "average") return one.figures.average!.unit! in UNITS.velocity ? "velocity" : "pressure";
  return null;
}
