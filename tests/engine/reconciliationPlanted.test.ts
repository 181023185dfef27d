import { afterAll, describe, expect, it } from "vitest";
import { reconciliation, type ExplanationAnswer, type ReconciliationInput } from "@/lib/airflow/calculations/reconciliation";

/** A generator of random numbers with a seed (mulberry32), so that a failure can be repeated. */
function generator(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}
const random = generator(20_250_321);
const whole = (from: number, to: number): number => from + Math.floor(random() * (to - from + 1));
const pick = <One>(from: readonly One[]): One => from[whole(0, from.length - 1)]!;
const round = (value: number, places: number): number => Number(value.toFixed(places));

/** A technician's sheet, with the arithmetic as it is done by hand. It knows nothing of the engine. */
interface Sheet {
  lines: number[][];
  /** Outside, with the lining, in inches. */
  width: number;
  height: number;
  lining: number;
}
interface Arithmetic {
  used: number[];
  divisor: number;
  count: number;
  area: number;
}

function randomSheet(): Sheet {
  const centre = whole(500, 3200);
  const [across, down] = [whole(4, 7), whole(4, 7)];
  const wall = (index: number, count: number): number => 1 - Math.abs((2 * index + 1) / count - 1);
  const lines = Array.from({ length: across }, (_, i) =>
    Array.from({ length: down }, (_, j) => Math.round(centre * (wall(i, across) * wall(j, down)) ** (1 / 7) * (1 + 0.06 * (random() - 0.5)))),
  );
  return { lines, width: whole(16, 60), height: whole(12, 48), lining: pick([0.5, 1, 1.5]) };
}

const insideArea = ({ width, height, lining }: Sheet): number => ((width - 2 * lining) * (height - 2 * lining)) / 144;
const rightly = (sheet: Sheet): Arithmetic => ({ used: sheet.lines.flat(), divisor: sheet.lines.flat().length, count: sheet.lines.flat().length, area: insideArea(sheet) });

/** What the technician reports: every figure rounded, the airflow from exact figures or from the rounded ones as written. */
function report({ used, divisor, count, area }: Arithmetic, fromRounded: boolean): ReconciliationInput["reported"] {
  const total = used.reduce((sum, reading) => sum + reading, 0);
  const average = round(total / divisor, 1);
  const writtenArea = round(area, 3);
  const airflow = Math.round(fromRounded ? average * writtenArea : (total / divisor) * area);
  return { total, count, average: { value: average, unit: "ft/min" }, area: { value: writtenArea, unit: "ft2" }, airflow: { value: airflow, unit: "ft3/min" } };
}

const inputOf = (sheet: Sheet, reported: ReconciliationInput["reported"]): ReconciliationInput => ({
  duct: {
    shape: "rectangular", measured: "outside",
    width: { value: sheet.width, unit: "in" }, height: { value: sheet.height, unit: "in" }, wall: { lining: { value: sheet.lining, unit: "in" } },
  },
  readings: { kind: "velocity", unit: "ft/min", lines: sheet.lines },
  reported,
});

interface Planted {
  arithmetic: Arithmetic;
  /** Whether an explanation is the slip that was planted. */
  isPlanted: (explanation: ExplanationAnswer) => boolean;
}
const isAt = (sheet: Sheet, index: number, explanation: ExplanationAnswer): boolean => {
  const down = sheet.lines[0]!.length;
  return explanation.at?.line === Math.floor(index / down) + 1 && explanation.at.point === (index % down) + 1;
};

function withDigits(sheet: Sheet, slip: string, change: (digits: string) => string | null): Planted | null {
  const right = rightly(sheet);
  const index = whole(0, right.used.length - 1);
  const digits = change(String(right.used[index]));
  if (digits === null || digits.startsWith("0") || Number(digits) === right.used[index]) return null;
  const used = right.used.with(index, Number(digits));
  return { arithmetic: { ...right, used }, isPlanted: (one) => one.slip === slip && isAt(sheet, index, one) && one.read === right.used[index] && one.used === Number(digits) };
}

const PLANT: Record<string, (sheet: Sheet) => Planted | null> = {
  "one digit": (sheet) => withDigits(sheet, "digit_changed", (digits) => {
    const place = whole(0, digits.length - 1);
    return digits.slice(0, place) + whole(0, 9) + digits.slice(place + 1);
  }),
  "swapped digits": (sheet) => withDigits(sheet, "digits_swapped", (digits) => {
    const place = whole(0, digits.length - 2);
    return digits.slice(0, place) + digits[place + 1] + digits[place] + digits.slice(place + 2);
  }),
  "reading left out": (sheet) => {
    const right = rightly(sheet);
    const index = whole(0, right.used.length - 1);
    const miscounted = random() < 0.5 ? 1 : 0;
    return {
      arithmetic: { ...right, used: right.used.toSpliced(index, 1), divisor: right.divisor - miscounted, count: right.count - miscounted },
      isPlanted: (one) => one.slip === "reading_left_out" && isAt(sheet, index, one),
    };
  },
  "wrong divisor": (sheet) => {
    const right = rightly(sheet);
    const divisor = right.divisor + pick([-3, -2, -1, 1, 2, 3]);
    return { arithmetic: { ...right, divisor, count: random() < 0.5 ? divisor : right.count }, isPlanted: (one) => one.slip === "wrong_count" && one.used === divisor };
  },
  "outside dimensions": (sheet) => ({
    arithmetic: { ...rightly(sheet), area: (sheet.width * sheet.height) / 144 },
    isPlanted: (one) => one.slip === "outside_for_inside" && one.figure === "area",
  }),
};

const TRIALS_A_KIND = 2_000;
const table: Record<string, Record<string, string | number>> = {};

describe("a slip planted at random in a random traverse", { timeout: 60_000 }, () => {
  it.each(Object.keys(PLANT))("%s is first or tied for first in at least 99 per cent of 2,000 trials", (kind) => {
    let [found, alone, explanations, reproduced] = [0, 0, 0, 0];
    for (let trial = 0; trial < TRIALS_A_KIND; ) {
      const sheet = randomSheet();
      const planted = PLANT[kind]!(sheet);
      if (!planted) continue;
      trial += 1;
      const answer = reconciliation(inputOf(sheet, report(planted.arithmetic, random() < 0.5)));
      const mine = answer.explanations.find((one) => planted.isPlanted(one) && one.also.length === 0);
      if (mine?.rank === 1) found += 1;
      if (mine?.rank === 1 && !mine.tied) alone += 1;
      if (mine?.figures.every(({ figure, value }) => withinReported(answer.figures.find((one) => one.figure === figure)!, value))) reproduced += 1;
      explanations += answer.explanations.length + answer.omitted;
    }
    table[kind] = { "first or tied for first": percent(found), "first alone": percent(alone), "explanations, mean": round(explanations / TRIALS_A_KIND, 2) };
    expect(found / TRIALS_A_KIND).toBeGreaterThanOrEqual(0.99);
    expect(reproduced).toBe(found);
  });

  it("is never invented: right arithmetic, rounded as it is written, is found to agree in 2,000 trials", () => {
    for (let trial = 0; trial < 2_000; trial += 1) {
      const sheet = randomSheet();
      const { conclusion, explanations } = reconciliation(inputOf(sheet, report(rightly(sheet), false)));
      expect(conclusion).toBe("agrees");
      expect(explanations).toEqual([]);
    }
  });

  it("is never invented: figures worked on from rounded ones are explained by rounding alone in 2,000 trials", () => {
    for (let trial = 0; trial < 2_000; trial += 1) {
      const sheet = randomSheet();
      const { explanations } = reconciliation(inputOf(sheet, report(rightly(sheet), true)));
      expect(explanations.every(({ slip, also }) => slip === "rounded_early" && also.every((other) => other.slip === "rounded_early"))).toBe(true);
    }
  });

  afterAll(() => console.table(table));
});

const percent = (count: number): string => `${((100 * count) / TRIALS_A_KIND).toFixed(2)} %`;
const withinReported = ({ reported, rounding }: { reported: number; rounding: number }, value: number): boolean => Math.abs(value - reported) <= rounding * (1 + 1e-6) + 1e-9;
