import { describe, expect, it } from "vitest";
import { wallDistance } from "@/lib/airflow/layout/chord";
import { layoutLines } from "@/lib/airflow/layout/layoutLines";
import type { Place } from "@/lib/airflow/layout/line";
import type { LayoutRule } from "@/lib/airflow/types";
import { reference, titleOf } from "./values";

const { facts, results } = reference["9_profiles"];
type Profile = (place: Place) => number;

/** A pipe of radius 1, and a square of side 2: distances from the wall are then in radii and half sides. */
const PIPE = { shape: "round", diameter: 2 } as const;
const SQUARE = { shape: "rectangular", width: 2, height: 2 } as const;

/** What the engine's points make of a profile. */
function meanByRule(inside: typeof PIPE | typeof SQUARE, layout: LayoutRule, points: Record<string, number>, profile: Profile): number {
  return layoutLines({ inside, wall: 0 }, { layout, points }).flatMap((line) => line.points).reduce((sum, point) => sum + point.weight * profile(point), 0);
}
const errorPercent = (byRule: number, exact: number): number => 100 * (byRule / exact - 1);

const inPipe = (u: (y: number) => number): Profile => (place) => u(wallDistance(PIPE, place));
const powerLaw = (n: number) => (y: number) => y ** (1 / n);
const logLaw = (Rplus: number) => (y: number) => Math.log(y * Rplus) / 0.41 + 5;
const inSquare = (n: number): Profile => ({ x, y }) => ((1 - Math.abs(x - 1)) * (1 - Math.abs(y - 1))) ** (1 / n);

/** Mean over a circle of radius 1, 2 ∫ u(y) (1 − y) dy; y = t³ tames the steep rise at the wall. Midpoint rule. */
function pipeMean(u: (y: number) => number, steps = 200_000): number {
  let sum = 0;
  for (let step = 0; step < steps; step += 1) {
    const t = (step + 0.5) / steps;
    sum += u(t ** 3) * (1 - t ** 3) * 3 * t ** 2;
  }
  return (2 * sum) / steps;
}

describe("exact means, integrated here", () => {
  const seventh = facts.find(({ name }) => name === "1/7 law mean/max")!;
  it(`the 1/7 law's mean is 49/60 of its greatest (${seventh.status}; ${titleOf(seventh.source)})`, () => {
    expect(49 / 60).toBeCloseTo(seventh.value as number, 12);
    expect(pipeMean(powerLaw(7))).toBeCloseTo(49 / 60, 8);
  });
  it.each(results.round_power)("power law n = $n", ({ n, exact_mean_over_max }) => {
    expect((2 * n ** 2) / ((n + 1) * (2 * n + 1))).toBeCloseTo(exact_mean_over_max, 12);
    expect(pipeMean(powerLaw(n), 20_000)).toBeCloseTo(exact_mean_over_max, 6);
  });
  it.each(results.round_log)("log law R+ = $Rplus", ({ Rplus, exact_mean_uplus }) => {
    expect((Math.log(Rplus) - 1.5) / 0.41 + 5).toBeCloseTo(exact_mean_uplus, 9);
    expect(pipeMean(logLaw(Rplus), 20_000)).toBeCloseTo(exact_mean_uplus, 5);
  });
});

/** Percentages agree with those computed outside the project to this many decimals. */
const DECIMALS = 8;

describe("the error of each rule on a round duct's profile, as computed outside the project", () => {
  const rules = (row: { equal_area_pct?: number; log_linear_printed_pct?: number | null }): [LayoutRule, number][] => [
    ...(row.equal_area_pct === undefined ? [] : [["equal_area", row.equal_area_pct] as [LayoutRule, number]]),
    ...(row.log_linear_printed_pct == null ? [] : [["log_linear", row.log_linear_printed_pct] as [LayoutRule, number]]),
  ];
  const power = results.round_power.flatMap((row) => rules(row).map(([layout, published]) => ({ ...row, layout, published })));
  const log = results.round_log.flatMap((row) => rules(row).map(([layout, published]) => ({ ...row, layout, published })));

  it.each(power)("power law n = $n, $points_per_diameter points, $layout: $published %", ({ n, points_per_diameter, exact_mean_over_max, layout, published }) => {
    const byRule = meanByRule(PIPE, layout, { perDiameter: points_per_diameter }, inPipe(powerLaw(n)));
    expect(errorPercent(byRule, exact_mean_over_max)).toBeCloseTo(published, DECIMALS);
  });
  it.each(log)("log law R+ = $Rplus, $points_per_diameter points, $layout: $published %", ({ Rplus, points_per_diameter, exact_mean_uplus, layout, published }) => {
    const byRule = meanByRule(PIPE, layout, { perDiameter: points_per_diameter }, inPipe(logLaw(Rplus)));
    expect(errorPercent(byRule, exact_mean_uplus)).toBeCloseTo(published, DECIMALS);
  });
  it.each(results.laminar)("laminar flow, $points_per_diameter points: equal annuli are exact", ({ points_per_diameter, log_linear_printed_pct }) => {
    const laminar = inPipe((y) => 1 - (1 - y) ** 2);
    expect(errorPercent(meanByRule(PIPE, "equal_area", { perDiameter: points_per_diameter }, laminar), 0.5)).toBeCloseTo(0, 10);
    expect(errorPercent(meanByRule(PIPE, "log_linear", { perDiameter: points_per_diameter }, laminar), 0.5)).toBeCloseTo(log_linear_printed_pct, DECIMALS);
  });
  it("three diameters see what two see of a profile that is the same all round", () => {
    const two = meanByRule(PIPE, "log_linear", { perDiameter: 8, diameters: 2 }, inPipe(powerLaw(7)));
    expect(meanByRule(PIPE, "log_linear", { perDiameter: 8, diameters: 3 }, inPipe(powerLaw(7)))).toBeCloseTo(two, 12);
  });
});

describe("the error of each rule on a rectangular duct's profile, as computed outside the project", () => {
  const ours = results.rect.flatMap((row) => {
    const [, rule, across, down] = /^(log-T printed|equal area) (\d+)x(\d+)$/.exec(row.rule) ?? [];
    return rule ? [{ ...row, layout: (rule === "equal area" ? "equal_area" : "log_tchebycheff") as LayoutRule, across: Number(across), down: Number(down) }] : [];
  });

  it("covers every grid but those of the unrounded positions", () => expect(ours).toHaveLength(results.rect.filter(({ rule }) => !rule.includes("derived")).length));

  it.each(ours)("n = $n, $rule: $error_pct %", ({ n, layout, across, down, exact_mean, error_pct }) => {
    expect((n / (n + 1)) ** 2).toBeCloseTo(exact_mean, 12);
    expect(errorPercent(meanByRule(SQUARE, layout, { across, down }, inSquare(n)), exact_mean)).toBeCloseTo(error_pct, DECIMALS);
  });
});

describe("whole traverses of a known profile, as computed outside the project", () => {
  const { sets, status } = reference["6_synthetic_traverses"];
  const round = sets.flatMap((set) => (set.y_over_D && set.D_m ? [{ ...set, y_over_D: set.y_over_D, D_m: set.D_m }] : []));

  it.each(round)(`round, $D_m m, $profile: depths and mean (${status})`, ({ D_m, y_over_D, profile, mean_velocity_by_rule, exact_mean_velocity }) => {
    const inside = { shape: "round" as const, diameter: D_m };
    const lines = layoutLines({ inside, wall: 0 }, { layout: "log_linear", points: { perDiameter: y_over_D.length } });
    const centre = Number(/u=(\d+)/.exec(profile)![1]);
    const velocity = (place: Place): number => centre * ((2 * wallDistance(inside, place)) / D_m) ** (1 / 7);
    for (const line of lines) line.points.forEach(({ depth }, index) => expect(depth).toBeCloseTo(y_over_D[index]! * D_m, 12));
    expect(lines.flatMap((line) => line.points).reduce((sum, point) => sum + point.weight * velocity(point), 0)).toBeCloseTo(mean_velocity_by_rule, 10);
    expect((centre * 49) / 60).toBeCloseTo(exact_mean_velocity, 10);
  });
});
