import { afterAll, describe, expect, it } from "vitest";
import { possibleSlips } from "@/lib/airflow/reconciliation/possibleSlips";
import { studentQuantile } from "@/lib/airflow/reconciliation/profileFit";

const STEADY = [
  [1012, 1056, 1094, 1050, 998],
  [1061, 1112, 1149, 1108, 1043],
  [1058, 1119, 1151, 1103, 1049],
  [1005, 1049, 1098, 1052, 1003],
];
const withReading = (line: number, point: number, reading: number | null): (number | null)[][] => STEADY.map((row, i) => row.map((value, j) => (i === line - 1 && j === point - 1 ? reading : value)));

describe("a possible slip", () => {
  it("is not seen in a steady profile", () => expect(possibleSlips(STEADY, "velocity")).toEqual([]));

  it("is seen where a digit is off, with the reading it was meant to be", () => {
    const [suspect, ...others] = possibleSlips(withReading(2, 3, 1749), "velocity");
    expect(others).toEqual([]);
    expect(suspect).toMatchObject({ line: 2, point: 3, read: 1749 });
    expect(suspect!.slips).toContainEqual({ slip: "digit_changed", value: 1149 });
  });

  it("is seen where a digit is missing", () => {
    const [suspect] = possibleSlips(withReading(1, 1, 101), "velocity");
    expect(suspect!.slips).toContainEqual({ slip: "digit_added", value: 1012 });
  });

  it("is seen where the decimal point moved, in velocity pressures", () => {
    const pressures = STEADY.map((row) => row.map((velocity) => Number(((velocity / 4005) ** 2).toFixed(3))));
    pressures[2]![1] = 0.78;
    const [suspect] = possibleSlips(pressures, "velocity_pressure");
    expect(suspect).toMatchObject({ line: 3, point: 2 });
    expect(suspect!.slips).toContainEqual({ slip: "decimal_moved", value: 0.078 });
  });

  it("is seen twice where there are two", () => {
    const lines = withReading(2, 3, 1749);
    lines[3]![0] = 105;
    expect(possibleSlips(lines, "velocity").map(({ line, point }) => [line, point])).toEqual(expect.arrayContaining([[2, 3], [4, 1]]));
  });

  it("is not told where nothing would bring the reading back", () => expect(possibleSlips(withReading(2, 3, 420), "velocity")).toEqual([]));
  it("is not told from a single line", () => expect(possibleSlips([[812, 934, 101, 1004, 921, 806]], "velocity")).toEqual([]));
  it("is not told where lines differ in length", () => expect(possibleSlips([[812, 934, 101], [804, 921, 806, 799], [812, 934, 900]], "velocity")).toEqual([]));
  it("leaves out what was not read", () => expect(possibleSlips(withReading(2, 3, null), "velocity")).toEqual([]));
});

describe("Student's t, two-sided 0.05 from the normal quantile 1.95996, against printed tables (from memory)", () => {
  it.each([[8, 2.306], [15, 2.131], [30, 2.042], [120, 1.98]])("%i degrees of freedom: %f", (freedom, printed) => expect(studentQuantile(1.95996, freedom)).toBeCloseTo(printed, 2));
});

/** Turbulent profiles with skew, swirl and noise; mulberry32 with a seed. */
let state = 71;
function random(): number {
  state = (state + 0x6d2b79f5) | 0;
  let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
  mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
  return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
}
const normal = (): number => Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());
const spread = (size: number): number => size * (2 * random() - 1);
const LOG_TCHEBYCHEFF = [0.074, 0.288, 0.5, 0.712, 0.926];
const LOG_LINEAR = [0.019, 0.077, 0.153, 0.217, 0.361, 0.639, 0.783, 0.847, 0.923, 0.981];

function rectangular(noise: number): number[][] {
  const [power, centre, across, down, swirl] = [1 / (6 + 3 * random()), 1000 + 2000 * random(), spread(0.15), spread(0.15), spread(0.075)];
  return LOG_TCHEBYCHEFF.map((x) => LOG_TCHEBYCHEFF.map((y) => {
    const [u, w] = [2 * x - 1, 2 * y - 1];
    return Math.round(centre * ((1 - Math.abs(u)) * (1 - Math.abs(w))) ** power * (1 + across * u + down * w + swirl * u * w) * (1 + noise * normal()));
  }));
}
function round(noise: number): number[][] {
  const [power, centre] = [1 / (6 + 3 * random()), 1000 + 2000 * random()];
  return [spread(0.15), spread(0.15)].map((skew) => LOG_LINEAR.map((x) => Math.round(centre * (1 - Math.abs(2 * x - 1)) ** power * (1 + skew * (2 * x - 1)) * (1 + noise * normal()))));
}

const TRIALS = 2_000;
const rates: Record<string, Record<string, string>> = {};

describe("over random turbulent profiles", () => {
  it.each([["rectangular 5 × 5", 0.02], ["rectangular 5 × 5", 0.05], ["round 2 × 10", 0.02], ["round 2 × 10", 0.05]] as const)("%s with noise of %f: false alarms stay under 3 in 100, most slips over a fifth are found", (shape, noise) => {
    const profile = shape === "round 2 × 10" ? round : rectangular;
    let [alarms, large, found, named] = [0, 0, 0, 0];
    for (let trial = 0; trial < TRIALS; trial += 1) {
      const lines = profile(noise);
      if (possibleSlips(lines, "velocity").length > 0) alarms += 1;
      const [line, point] = [Math.floor(random() * lines.length), Math.floor(random() * lines[0]!.length)];
      const right = lines[line]![point]!;
      const digits = String(right);
      const place = Math.floor(random() * digits.length);
      const wrong = Number(digits.slice(0, place) + Math.floor(random() * 10) + digits.slice(place + 1));
      if (Math.abs(Math.log(wrong / right)) < 0.2 || String(wrong).length !== digits.length) continue;
      large += 1;
      lines[line]![point] = wrong;
      const suspect = possibleSlips(lines, "velocity").find((one) => one.line === line + 1 && one.point === point + 1);
      if (suspect) found += 1;
      if (suspect?.slips.some(({ value }) => value === right)) named += 1;
    }
    const share = (count: number, of: number): string => `${((100 * count) / of).toFixed(1)} %`;
    rates[`${shape}, noise ${100 * noise} %`] = { "false alarms a traverse": share(alarms, TRIALS), "digit slips over 20 % found": share(found, large), "right reading named": share(named, found) };
    expect(alarms / TRIALS).toBeLessThan(0.03);
    expect(found / large).toBeGreaterThan(0.65);
  });

  afterAll(() => console.table(rates));
});
