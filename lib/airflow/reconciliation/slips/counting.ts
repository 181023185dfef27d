import type { Case, CasePoint } from "../case";
import type { Hypothesis, SlipFamily } from "../hypothesis";
import { fits, readingTarget } from "../readingTarget";
import { isReproduced } from "../reproduce";
import type { Slip } from "../slip";
import { averageOn, areaOn, velocityOn, withReading, type Worksheet } from "../worksheet";

/** A reading left out of the sum, or added twice: with the count as it should be, or miscounted along with it. */
export const omissionAndRepetition: SlipFamily = (one, sheet) => {
  const target = readingTarget(one, sheet);
  if (!target) return [];
  return one.points.flatMap((point) =>
    ([-1, 1] as const).flatMap((sign) =>
      ([0, sign] as const).flatMap((counted) => {
        const velocity = sign * velocityOn(sheet, point.velocity);
        return fits(target, sign * point.reading, velocity, point.weight, counted * point.weight) ? [countedOtherwise(one, sheet, point, sign, counted)] : [];
      }),
    ),
  );
};

function countedOtherwise(one: Case, sheet: Worksheet, { line, point, written, reading, velocity, weight }: CasePoint, sign: -1 | 1, counted: -1 | 0 | 1): Hypothesis {
  const leftOut = sign === -1;
  const count = sheet.count + counted;
  const slip: Slip = {
    slip: leftOut ? "reading_left_out" : "reading_repeated",
    at: { line, point },
    read: written,
    used: leftOut ? null : written,
    unit: one.readings.unit,
    detail: `Line ${line}, point ${point}, ${written}, was ${leftOut ? "left out of the sum" : "added twice"}; the sum was divided by ${count}.`,
  };
  return { slips: [slip], sheet: withReading(sheet, sign * reading, sign * velocityOn(sheet, velocity), weight, counted * weight, counted) };
}

/** The sum divided by the wrong count. Counts from half to twice the right one are tried. */
export const wrongCount: SlipFamily = (one, sheet) => {
  if (!one.equalWeights) return [];
  const { count } = one.figures;
  const found: Hypothesis[] = [];
  const suppose = (figureCount: number, divisor: number): void => {
    const detail = divisor === sheet.divisor ? `There are ${sheet.count} readings; ${figureCount} were counted.` : `The sum of ${sheet.count} readings was divided by ${divisor}.`;
    const used = divisor === sheet.divisor ? figureCount : divisor;
    found.push({ slips: [{ slip: "wrong_count", figure: "count", read: sheet.count, used, unit: null, detail }], sheet: { ...sheet, count: figureCount, divisor } });
  };
  if (count && count.value !== sheet.count) suppose(count.value, sheet.divisor);
  for (const divisor of divisorsToTry(one, sheet)) {
    if (divisor !== sheet.divisor) suppose(count && count.value !== divisor ? sheet.count : divisor, divisor);
  }
  return found;
};

/** The reported count, and the one that the reported average or airflow implies. */
function divisorsToTry(one: Case, sheet: Worksheet): Set<number> {
  const { average, airflow, count } = one.figures;
  const implied = (reported: number, now: number): number => Math.round((sheet.divisor * now) / reported);
  const tries = [count?.value ?? sheet.divisor];
  if (average && average.value > 0) {
    const now = average.unit === one.readings.unit && one.readings.kind === "velocity_pressure" ? sheet.weightedReadings / sheet.divisor : averageOn(one, sheet) / average.factor;
    if (!isReproduced(now, average)) tries.push(implied(average.value, now));
  }
  if (airflow && airflow.value > 0) tries.push(implied(airflow.value, (averageOn(one, sheet) * areaOn(one, sheet)! * sheet.airflowFactor) / airflow.factor));
  return new Set(tries.filter((divisor) => divisor >= sheet.divisor / 2 && divisor <= 2 * sheet.divisor));
}
