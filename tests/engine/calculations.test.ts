import { describe, expect, it } from "vitest";
import { airDensity } from "@/lib/airflow/calculations/airDensity";
import { airflow, type AirflowInput } from "@/lib/airflow/calculations/airflow";
import { averageVelocity } from "@/lib/airflow/calculations/averageVelocity";
import { ductArea } from "@/lib/airflow/calculations/ductArea";
import type { Air, Duct } from "@/lib/airflow/types";

const inches = (value: number) => ({ value, unit: "in" as const });
const fahrenheit = (value: number) => ({ value, unit: "degF" as const });
const percent = (value: number) => ({ value, unit: "percent" as const });
const ROUND: Duct = { shape: "round", measured: "inside", diameter: inches(14) };
const READINGS = { kind: "velocity" as const, unit: "ft/min" as const, lines: [[900, 1000], [1000, 1100]] };
const PRESSURES = { kind: "velocity_pressure" as const, unit: "in_wg" as const, lines: [[0.06, 0.08, 0.07], [0.065, 0.085, 0.072]] };

describe("the inside of a duct", () => {
  it("is the outside less board and lining on both sides", () => {
    const { inside, area } = ductArea({ duct: { shape: "rectangular", measured: "outside", width: inches(26), height: inches(18), wall: { thickness: inches(0.5), lining: inches(0.5) } } });
    expect(inside).toMatchObject({ width: { unit: "in" }, height: { unit: "in" } });
    expect(area.value).toBeCloseTo((24 * 16) / 144, 12);
  });
  it("is what was measured inside, whatever the wall", () => {
    expect(ductArea({ duct: { ...ROUND, wall: { lining: inches(2) } } }).area.value).toBeCloseTo((Math.PI * 49) / 144, 12);
  });
});

describe("the air in a duct", () => {
  it("says what it assumed", () => {
    expect(airDensity({ air: { dryBulb: fahrenheit(70) } }).assumed).toEqual(["dry_air", "sea_level"]);
    expect(airDensity({ air: { dryBulb: fahrenheit(70), relativeHumidity: percent(0), altitude: { value: 0, unit: "ft" } } }).assumed).toEqual([]);
    expect(airflow({ duct: ROUND, readings: READINGS }).air.assumed).toEqual(["standard_air"]);
  });
  it("is the same however its humidity is given", () => {
    const base = { dryBulb: fahrenheit(75), altitude: { value: 1640, unit: "ft" as const } };
    const { density, humidityRatio } = airDensity({ air: { ...base, wetBulb: fahrenheit(64) } });
    expect(airDensity({ air: { ...base, humidityRatio: humidityRatio! } }).density.value).toBeCloseTo(density.value, 14);
  });
});

describe("readings", () => {
  it("that could not be taken are skipped and said", () => {
    const answer = averageVelocity({ readings: { ...READINGS, lines: [[900, null], [null, 1100]] } });
    expect(answer.averageVelocity.value).toBeCloseTo(1000, 9);
    expect(answer.statistics).toMatchObject({ count: 2, skipped: 2 });
    expect(answer.points.map(({ line, point }) => [line, point])).toEqual([[1, 1], [2, 2]]);
  });
  it("below zero count as zero, stay in the count and are pointed at", () => {
    const answer = averageVelocity({ readings: { ...READINGS, lines: [[900, -50]] } });
    expect(answer.averageVelocity.value).toBeCloseTo(450, 9);
    expect(answer.checks.find(({ code }) => code === "negative_reading")).toMatchObject({ passed: false, at: [{ line: 1, point: 2 }] });
  });
  it("count by their weights", () => {
    expect(averageVelocity({ readings: { ...READINGS, lines: [[900, 1100]], weights: [[3, 1]] } }).averageVelocity.value).toBeCloseTo(950, 9);
  });
  it("are corrected by the instrument's calibration first", () => {
    const answer = averageVelocity({ readings: { ...READINGS, lines: [[1000]] }, instrument: { principle: "rotating_vane", calibration: { gain: 1.02, offset: -5 } } });
    expect(answer.averageVelocity.value).toBeCloseTo(1015, 9);
  });
});

describe("airflow against design", () => {
  const measured: AirflowInput = { duct: ROUND, readings: READINGS, instrument: { principle: "rotating_vane" } };
  const { value } = airflow(measured).airflow.actual;
  const verdictAt = (design: number) => airflow({ ...measured, design: { airflow: { value: design, unit: "ft3/min" } } }).design!.verdict;

  it("is within near the design, outside far from it, and undecided at the edge of the tolerance", () => {
    expect([value, value / 1.1, value / 1.3].map(verdictAt)).toEqual(["within", "undecided", "outside"]);
  });
  it("compares on the basis that the design names", () => {
    const air: Air = { density: { value: 0.06, unit: "lb/ft3" } };
    const design = { airflow: { value, unit: "ft3/min" as const } };
    expect(airflow({ ...measured, air, design: { ...design, basis: "actual" } }).design!.percent).toBeCloseTo(100, 9);
    expect(airflow({ ...measured, air, design: { ...design, basis: "standard" } }).design!.percent).toBeCloseTo(80, 9);
  });
});

describe("what averaging pressures would have given", () => {
  it("is the same where all readings are, in slow air and in air that compresses", () => {
    for (const pressure of [60, 2000]) {
      const { averageVelocity: mean, averagingPressuresWouldGive } = averageVelocity({ readings: { kind: "velocity_pressure", unit: "Pa", lines: [[pressure, pressure]] }, units: "si" });
      expect(averagingPressuresWouldGive!.value).toBeCloseTo(mean.value, 9);
    }
  });
  it("is more where they differ, and is not said of velocities", () => {
    const { averageVelocity: mean, averagingPressuresWouldGive } = averageVelocity({ readings: PRESSURES });
    expect(averagingPressuresWouldGive!.value).toBeGreaterThan(mean.value);
    expect(averageVelocity({ readings: READINGS }).averagingPressuresWouldGive).toBeNull();
  });
});

describe("the uncertainty budget", () => {
  const rowOf = (input: Partial<AirflowInput>, name: string): number => airflow({ duct: ROUND, readings: READINGS, ...input }).uncertainty.budget.find((row) => row.name === name)!.percent;

  it("says of every row whether it was given or is a default", () => {
    const origins = (input: Partial<AirflowInput>): string[] => airflow({ duct: ROUND, readings: READINGS, ...input }).uncertainty.budget.map(({ origin }) => origin);
    expect(new Set(origins({}))).toEqual(new Set(["default"]));
    const uncertainty = { dimension: inches(0.1), densityPercent: 1, layoutPercent: 1, sitePercent: 1, fluctuationPercent: 1, resolution: 1 };
    expect(new Set(origins({ instrument: { principle: "thermal", accuracy: { percentOfReading: 3 } }, uncertainty }))).toEqual(new Set(["given"]));
  });
  it("takes density by what the instrument senses, and for the design by what it does to that airflow", () => {
    const uncertainty = { densityPercent: 4, layoutPercent: 0, sitePercent: 0, fluctuationPercent: 0, resolution: 0, dimension: inches(0) };
    const expanded = (principle: "thermal" | "rotating_vane" | "differential_pressure", basis: "actual" | "standard"): number => {
      const { airflow: flow, design } = airflow({ duct: ROUND, readings: READINGS, instrument: { principle, accuracy: { percentOfReading: 0 } }, uncertainty, design: { airflow: { value: 1000, unit: "ft3/min" }, basis } });
      return (100 * design!.expandedUncertainty.value) / flow[basis].value;
    };
    expect(expanded("differential_pressure", "actual")).toBeCloseTo(4, 9);
    expect(expanded("differential_pressure", "standard")).toBeCloseTo(4, 9);
    expect(expanded("thermal", "actual")).toBeCloseTo(8, 9);
    expect(expanded("thermal", "standard")).toBeCloseTo(0, 9);
    expect(expanded("rotating_vane", "actual")).toBeCloseTo(0, 9);
    expect(expanded("rotating_vane", "standard")).toBeCloseTo(8, 9);
  });
  it("takes the site as good, disturbed or unknown", () => {
    const site = (downstream: number, upstream: number) => rowOf({ site: { downstream: inches(14 * downstream), upstream: inches(14 * upstream) } }, "site");
    expect([site(7.5, 3), site(7.4, 3), site(7.5, 2.9), rowOf({}, "site")]).toEqual([0, 1.5, 1.5, 1]);
  });
  it("takes the resolution from the digits written", () => {
    expect(rowOf({ readings: { ...READINGS, lines: [[900, 1000.5]] } }, "rounding")).toBeCloseTo(rowOf({ readings: { ...READINGS, lines: [[900, 1000.5]] }, uncertainty: { resolution: 0.1 } }, "rounding"), 12);
  });
  it("stays finite where no air moves", () => {
    const { uncertainty } = airflow({ duct: ROUND, readings: { ...PRESSURES, lines: [[0, 0, -0.001]] }, instrument: { principle: "differential_pressure", accuracy: { absolute: { value: 0.001, unit: "in_wg" } } } });
    expect(uncertainty.expanded.value).toBe(0);
    expect(Number.isFinite(uncertainty.expandedPercent)).toBe(true);
  });
});

describe("checks", () => {
  const codeOf = (input: Partial<AirflowInput>, code: string) => airflow({ duct: ROUND, readings: PRESSURES, air: { dryBulb: fahrenheit(70), relativeHumidity: percent(40), altitude: { value: 0, unit: "ft" } }, ...input }).checks.find((check) => check.code === code);

  it("pass on a good traverse", () => {
    const failed = airflow({ duct: ROUND, readings: PRESSURES, air: { dryBulb: fahrenheit(70), relativeHumidity: percent(40), altitude: { value: 0, unit: "ft" } } }).checks.filter(({ passed }) => !passed);
    expect(failed).toEqual([]);
  });
  it("count the points against the layout's rule, and the budget grows by what is missing", () => {
    const duct: Duct = { shape: "rectangular", measured: "inside", width: inches(24), height: inches(16) };
    const read = (count: number, layout: AirflowInput["layout"]) => airflow({ duct, layout, readings: { ...READINGS, lines: [Array.from({ length: count }, () => 900)] } });
    const checkOf = (count: number, layout: AirflowInput["layout"]) => read(count, layout).checks.find(({ code }) => code === "points_below_minimum");
    const layoutPercent = (count: number) => read(count, "log_tchebycheff").uncertainty.budget.find(({ name }) => name === "layout")!.percent;
    expect(checkOf(25, "log_tchebycheff")).toMatchObject({ passed: true, compared: { value: 25, limit: 25 } });
    expect(checkOf(20, "log_tchebycheff")).toMatchObject({ passed: false, compared: { value: 20, limit: 25 } });
    expect([checkOf(20, "custom"), checkOf(20, undefined)]).toEqual([undefined, undefined]);
    expect([layoutPercent(30), layoutPercent(25), layoutPercent(20)]).toEqual([1, 1, 1.25]);
    expect(() => read(20, "log_linear")).toThrow(/not for rectangular ducts/);
  });
  it("see an uneven profile by its pressures", () => expect(codeOf({ readings: { ...PRESSURES, lines: [[0.1, 0.1, 0.009, 0.009]] } }, "uniformity")).toMatchObject({ passed: false, severity: "failure", compared: { value: 50, limit: 75 } }));
  it("see air too slow for a pitot-static probe", () => expect(codeOf({ readings: { ...PRESSURES, lines: [[0.01, 0.01]] } }, "low_velocity")).toMatchObject({ passed: false }));
  it("see one half faster than the other", () => expect(codeOf({ readings: { ...PRESSURES, lines: [[0.03, 0.03, 0.1, 0.1]] } }, "profile_asymmetry")).toMatchObject({ passed: false }));
  it("see a plane too near an elbow", () => expect(codeOf({ site: { downstream: inches(28), upstream: inches(60) } }, "site_disturbance")).toMatchObject({ passed: false, compared: { value: 2, limit: 7.5 } }));
  it("see a thick probe", () => expect(codeOf({ probe: { diameter: inches(0.5) } }, "probe_blockage")).toMatchObject({ passed: false }));
  it("see what was assumed", () => expect(codeOf({ air: undefined }, "density_assumed")).toMatchObject({ passed: false }));
});

describe("working", () => {
  it("is there only where it was asked for", () => expect("working" in ductArea({ duct: ROUND })).toBe(false));

  it("can be redone by hand, step by step", () => {
    const { working, airflow: flow, area, averageVelocity: mean, air } = airflow({ duct: ROUND, readings: PRESSURES, air: { dryBulb: fahrenheit(58), relativeHumidity: percent(85) }, working: true });
    const step = (name: string) => working!.find((one) => one.step === name)!;
    expect(step("Area").value.value).toBeCloseTo((Math.PI * step("Area").inputs.D!.value ** 2) / 4 / 144, 10);
    expect(step("Average velocity").value.value).toBeCloseTo(step("Average velocity").inputs["Σ V"]!.value / step("Average velocity").inputs.n!.value, 9);
    expect(step("Airflow, actual").value.value).toBeCloseTo(area.value * mean.value, 9);
    expect(step("Mass flow").value.value).toBeCloseTo(flow.actual.value * air.density.value, 9);
    expect(step("Airflow, standard").value.value).toBeCloseTo((flow.actual.value * air.density.value) / 0.075, 8);
    expect(working!.every(({ equation, source }) => equation.length > 0 && source.length > 0)).toBe(true);
  });
});
