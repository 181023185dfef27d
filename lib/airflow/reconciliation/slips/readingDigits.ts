import type { Case, CasePoint } from "../case";
import { forEachDigitVariant, type DigitSlip } from "../digitVariants";
import type { Hypothesis, SlipFamily } from "../hypothesis";
import { neededReading, readingTarget } from "../readingTarget";
import { velocityOn, withReading, type Worksheet } from "../worksheet";

const WORDS: Record<DigitSlip, string> = {
  digit_changed: "with one digit changed",
  digits_swapped: "with two digits swapped",
  digit_dropped: "with a digit dropped",
  digit_added: "with a digit too many",
  decimal_moved: "with the decimal point moved",
};

/** Nobody writes a reading with more decimal places; what has more was computed, and its digits were never copied. */
export const MOST_PLACES = 6;
/** Where so many slips fit, the figures tell nothing of which it was, and no more are looked for. */
const MOST_FOUND = 2_000;

/** A reading used with a slip in its digits. For each reading the report leaves a narrow range; only slips that lead there are looked at. */
export const readingDigits: SlipFamily = (one, sheet) => {
  const target = readingTarget(one, sheet);
  if (!target || one.places > MOST_PLACES) return [];
  const found: Hypothesis[] = [];
  for (const point of one.points) {
    if (found.length >= MOST_FOUND) break;
    const [low, high] = neededReading(one, sheet, target, point);
    const visit = (slip: DigitSlip, used: number): void => {
      const counted = one.effective(used);
      if (counted >= low && counted <= high) found.push(digitHypothesis(one, sheet, point, slip, used));
    };
    if (one.isCalibrated) forEachDigitVariant(point.written, one.places, visit);
    else forEachDigitVariant(point.written, one.places, visit, low, high);
  }
  return found;
};

export function digitHypothesis(one: Case, sheet: Worksheet, { line, point, written, reading, velocity, weight }: CasePoint, slip: DigitSlip, used: number): Hypothesis {
  const counted = one.effective(used);
  const changed = velocityOn(sheet, one.velocitiesOf([counted])[0]!) - velocityOn(sheet, velocity);
  return {
    slips: [{ slip, at: { line, point }, read: written, used, unit: one.readings.unit, detail: `Line ${line}, point ${point} reads ${written} and was used ${WORDS[slip]}, as ${used}.` }],
    sheet: withReading(sheet, counted - reading, changed, weight),
  };
}
