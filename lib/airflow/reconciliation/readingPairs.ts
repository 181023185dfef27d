import type { Case, CasePoint } from "./case";
import { forEachDigitVariant, type DigitSlip } from "./digitVariants";
import type { Hypothesis } from "./hypothesis";
import { readingTarget } from "./readingTarget";
import { digitHypothesis, MOST_PLACES } from "./slips/readingDigits";
import { velocityOn, type Worksheet } from "./worksheet";

interface Variant {
  point: CasePoint;
  slip: DigitSlip;
  used: number;
  /** What it does to the total. */
  change: number;
}

/**
 * Pairs of readings each used with a slip in its digits that together bring the reported total about. For each slip the one
 * that makes up the rest is looked up by its change. Stops as soon as there are more than `most`: by then they tell nothing.
 */
export function readingPairs(one: Case, sheet: Worksheet, most: number): Hypothesis[] {
  const target = readingTarget(one, sheet);
  if (!target?.total || one.places > MOST_PLACES) return [];
  const needed = [target.low - target.sum, target.high - target.sum] as const;
  const width = needed[1] - needed[0];
  const before = new Map<number, Variant[]>();
  const found: Hypothesis[] = [];
  for (const point of one.points) {
    const variants = variantsOf(one, sheet, point);
    for (const variant of variants) {
      const bucket = Math.floor((needed[0] - variant.change) / width);
      for (const other of [...(before.get(bucket) ?? []), ...(before.get(bucket + 1) ?? [])]) {
        const change = variant.change + other.change;
        if (change < needed[0] || change > needed[1]) continue;
        found.push(pairOf(one, sheet, other, variant));
        if (found.length > most) return found;
      }
    }
    for (const variant of variants) {
      const bucket = Math.floor(variant.change / width);
      const list = before.get(bucket);
      if (list) list.push(variant);
      else before.set(bucket, [variant]);
    }
  }
  return found;
}

function variantsOf(one: Case, sheet: Worksheet, point: CasePoint): Variant[] {
  const variants: Variant[] = [];
  forEachDigitVariant(point.written, one.places, (slip, used) => variants.push({ point, slip, used, change: one.effective(used) - point.reading }));
  if (one.totalOf === "readings") return variants;
  const velocities = one.velocitiesOf(variants.map(({ used }) => one.effective(used)));
  return variants.map((variant, index) => ({ ...variant, change: velocityOn(sheet, velocities[index]!) - velocityOn(sheet, point.velocity) }));
}

function pairOf(one: Case, sheet: Worksheet, first: Variant, second: Variant): Hypothesis {
  const start = digitHypothesis(one, sheet, first.point, first.slip, first.used);
  const both = digitHypothesis(one, start.sheet, second.point, second.slip, second.used);
  return { slips: [...start.slips, ...both.slips], sheet: both.sheet };
}
