import { describe, expect, it } from "vitest";
import { airDensity } from "@/lib/airflow/calculations/airDensity";
import { airflow } from "@/lib/airflow/calculations/airflow";
import { averageVelocity } from "@/lib/airflow/calculations/averageVelocity";
import { densityCorrection } from "@/lib/airflow/calculations/densityCorrection";
import { fromSi, toSi } from "@/lib/airflow/units/convert";
import { compressibilityFactor, velocityFromPressure } from "@/lib/airflow/velocity/velocityFromPressure";
import { weightedMean } from "@/lib/airflow/velocity/mean";
import { verdict } from "@/lib/airflow/uncertainty/verdict";
import { reference, relative, titleOf } from "./values";

const kg = (value: number) => ({ density: { value, unit: "kg/m3" as const } });

describe("worked examples", () => {
  // The sources round g and R; each comparison is to the digits they print.
  it(`2.4 cm of water in air at 45 °C, 98 kPa: 20.94 m/s (read: ${titleOf("CENGEL")}; g 9.81, R 287)`, () => {
    const { density } = airDensity({ air: { dryBulb: { value: 45, unit: "degC" }, barometricPressure: { value: 98, unit: "kPa" } }, units: "si" });
    expect(velocityFromPressure(235.44, density.value)).toBeCloseTo(20.94, 1);
  });
  it(`12 mm of water, 1.2 kg/m³: 14 m/s (read: ${titleOf("GATE12")})`, () => expect(Math.round(velocityFromPressure(12 * 9.80665, 1.2))).toBe(14));
  it(`10 mm of water, 1.2 kg/m³, g 9.8: 12.8 m/s (read: ${titleOf("GATE10")})`, () => expect(velocityFromPressure(10 * 9.8, 1.2)).toBeCloseTo(12.8, 1));

  const onConventionalInch = (inches: number): number => fromSi("velocity", velocityFromPressure(toSi("pressure", { value: inches, unit: "in_wg" }), toSi("density", { value: 0.075, unit: "lb/ft3" })), "ft/min").value;
  it.each([[3.15, 7108.17], [0.866, 3727.02]])(`%f in wg with the constant 4005: %f ft/min, ours 0.089 %% above (read: ${titleOf("VENTPROB")})`, (inches, printed) => {
    expect(onConventionalInch(inches) / printed).toBeCloseTo(4008.551 / 4005, 5);
  });
  it(`1.5 m² at 4000 ft/min: 64 583.46 ft³/min (read: ${titleOf("VENTPROB")})`, () => {
    const answer = airflow({
      duct: { shape: "rectangular", measured: "inside", width: { value: 1.5, unit: "m" }, height: { value: 1, unit: "m" } },
      readings: { kind: "velocity", unit: "ft/min", lines: [[4000]] },
    });
    expect(answer.airflow.actual.value).toBeCloseTo(64_583.46, 2);
  });
  it(`350 m³/s through 25 ft²: 29 664.3 ft/min (read: ${titleOf("VENTPROB")})`, () => {
    expect(fromSi("velocity", 350 / toSi("area", { value: 25, unit: "ft2" }), "ft/min").value).toBeCloseTo(29_664.3, 1);
  });
  it(`300 × 400 mm, 65 Pa, 35 °C, 748 mmHg: 1.288 m³/s (inputs read: ${titleOf("MHF")}; answer computed with g 9.81, R 287)`, () => {
    const answer = airflow({
      duct: { shape: "rectangular", measured: "inside", width: { value: 300, unit: "mm" }, height: { value: 400, unit: "mm" } },
      readings: { kind: "velocity_pressure", unit: "Pa", lines: [[65]] },
      air: { dryBulb: { value: 35, unit: "degC" }, barometricPressure: { value: 0.748 * 13_600 * 9.81, unit: "Pa" } },
      units: "si",
    });
    expect(answer.air.density.value).toBeCloseTo(1.1284, 3);
    expect(answer.averageVelocity.value).toBeCloseTo(10.733, 2);
    expect(answer.airflow.actual.value).toBeCloseTo(1288.0, 0);
  });
  it("the mean of the roots of 0.04, 0.09, 0.16, 0.25 is 0.35, not the root of the mean (computed)", () => {
    const check = reference["6_synthetic_traverses"].roots_check;
    const answer = averageVelocity({ readings: { kind: "velocity_pressure", unit: "in_wg", lines: [check.VP] } });
    expect(answer.averageVelocity.value / check.V_4005_right).toBeCloseTo(4008.551 / 4005, 6);
    expect(answer.averagingPressuresWouldGive!.value / check.V_4005_wrong).toBeCloseTo(4008.551 / 4005, 6);
  });
});

describe(`traverses of known profiles (${reference["6_synthetic_traverses"].status})`, () => {
  it.each(reference["6_synthetic_traverses"].sets.map((set) => ({ ...set, title: `${set.shape} ${set.profile}, ${"points" in set ? set.points : `${set.y_over_D?.length} points`}` })))("$title", (set) => {
    const duct =
      set.D_m === undefined
        ? { shape: "rectangular" as const, measured: "inside" as const, width: { value: set.W_m!, unit: "m" as const }, height: { value: set.H_m!, unit: "m" as const } }
        : { shape: "round" as const, measured: "inside" as const, diameter: { value: set.D_m, unit: "m" as const } };
    const answer = airflow({ duct, readings: { kind: "velocity_pressure", unit: "Pa", lines: set.VP_Pa_rows ?? [set.VP_Pa!] }, air: kg(set.rho), units: "si" });
    // The pressures are printed to four decimals.
    expect(relative(answer.averageVelocity.value, set.mean_velocity_by_rule)).toBeLessThan(2e-6);
    expect(relative(answer.airflow.actual.value / 1000, set.Q_by_rule)).toBeLessThan(2e-6);
    expect(relative(answer.averagingPressuresWouldGive!.value, set.wrong_velocity_from_mean_VP)).toBeLessThan(2e-6);
  });
});

describe("40 CFR 60 Method 2", () => {
  it(`its constant 85.49 follows from V = C √(2 p_v/ρ) within 0.04 % (read: ${titleOf(["RATA", "NCDEQ"])})`, () => {
    // 1 in of water, 1 lb/lbmol, 1 °R, 1 inHg: ρ = p M / (R T).
    const density = (toSi("pressure", { value: 1, unit: "inHg" }) * 0.001) / (8.314462618 / 1.8);
    const feetPerSecond = velocityFromPressure(toSi("pressure", { value: 1, unit: "in_wg" }), density) / 0.3048;
    expect(relative(feetPerSecond, 85.52432829288568)).toBeLessThan(1e-6);
    expect(relative(feetPerSecond, 85.49)).toBeLessThan(4.1e-4);
  });
  it(`run 3: 33.76 ft/s through 5.940 ft² is 12 032 ft³/min (read: ${titleOf("NCDEQ")}; the area from the block's note)`, () => {
    expect(fromSi("airflow", 33.76 * 0.3048 * toSi("area", { value: 5.94, unit: "ft2" }), "ft3/min").value).toBeCloseTo(12_032, 0);
  });
  it("a coefficient of 0.84 gives 0.84 of the velocity of one of 1 (memory: Method 2's S-type)", () => {
    const readings = { kind: "velocity_pressure" as const, unit: "in_wg" as const, lines: [[0.5, 0.6]] };
    expect(averageVelocity({ readings, probe: { coefficient: 0.84 } }).averageVelocity.value / averageVelocity({ readings }).averageVelocity.value).toBeCloseTo(0.84, 12);
  });
});

describe(`compressibility (${reference["10_compressibility"].status}; form ${reference["10_compressibility"].form.status})`, () => {
  it.each(reference["10_compressibility"].rows)("at $V m/s: ISO 3966's form to its digits", ({ dp_Pa, ISO_form_kappa_minus_1 }) => {
    expect(relative(compressibilityFactor(dp_Pa, 101_325), ISO_form_kappa_minus_1)).toBeLessThan(1e-10);
  });
  // ISO's last coefficient is (κ − 1)/6κ², the isentropic series has (κ + 1)/6κ²: under the root they differ by r²/3κ²,
  // and so the factors by about r²/6κ² (8e-6 at 40 m/s).
  it.each(reference["10_compressibility"].rows)("at $V m/s: off the isentropic equation by what the series' last term explains", ({ dp_Pa, dp_over_p, one_minus_eps_exact }) => {
    const explained = dp_over_p ** 2 / (6 * 1.4 ** 2);
    expect(Math.abs(one_minus_eps_exact - compressibilityFactor(dp_Pa, 101_325) - explained)).toBeLessThan(0.06 * explained + 1e-9);
  });
});

describe("uncertainty and verdict", () => {
  const { inputs, components_relative_standard: parts, rho, q_m3_s } = reference["8_uncertainty"].gum_example;
  const standard = Math.sqrt(3); // from a standard uncertainty to the half-width of a rectangular distribution

  const answer = airflow({
    duct: { shape: "round", measured: "inside", diameter: { value: inputs.D_m, unit: "m" } },
    readings: { kind: "velocity_pressure", unit: "Pa", lines: [inputs.dp_Pa.slice(0, 10), inputs.dp_Pa.slice(10)] },
    air: kg(rho),
    instrument: { principle: "differential_pressure", accuracy: { percentOfReading: 100 * inputs.u_gain_rel * standard, absolute: { value: inputs.u_offset_Pa * standard, unit: "Pa" } } },
    uncertainty: { dimension: { value: inputs.u_D * standard, unit: "m" }, layoutPercent: 100 * inputs.u_method_rel, sitePercent: 0, fluctuationPercent: 100 * inputs.u_noise_rel_each, resolution: 0 },
    units: "si",
  });
  const percentOf = (name: string): number => answer.uncertainty.budget.find((row) => row.name === name)!.percent;

  it("the constructed GUM example: airflow (computed)", () => expect(relative(answer.airflow.actual.value / 1000, q_m3_s)).toBeLessThan(1e-9));
  it("the constructed GUM example: area, layout and instrument (computed)", () => {
    expect(percentOf("area")).toBeCloseTo(100 * parts.D, 9);
    expect(percentOf("layout")).toBeCloseTo(1, 9);
    expect(percentOf("instrument")).toBeCloseTo(100 * Math.hypot(parts["dp gain (common to all readings)"], parts["dp zero offset (common)"]), 6);
  });
  it("the constructed GUM example: noise within 1 % of the exact propagation over unequal readings (computed)", () => {
    expect(relative(percentOf("fluctuation"), 100 * parts["dp reading noise (independent)"])).toBeLessThan(0.011);
  });
  it(`rows combine in quadrature and expand with k = 2 (memory: ${titleOf("TN1297")})`, () => {
    const combined = Math.hypot(...answer.uncertainty.budget.map(({ percent }) => percent));
    expect(answer.uncertainty.combinedPercent).toBeCloseTo(combined, 12);
    expect(answer.uncertainty.expandedPercent).toBeCloseTo(2 * combined, 12);
  });
  it(`guard band w = U: accepted up to the limit less U, rejected beyond the limit plus U (read: ${titleOf("ILAC")}; w = U from memory)`, () => {
    expect([90, 94, 99, 106, 112, 114].map((airflowMeasured) => verdict(airflowMeasured, 100, 3, 10))).toEqual(["undecided", "within", "within", "within", "undecided", "outside"]);
  });
});

describe("closed forms that need no table", () => {
  it("correcting from one air to another and back is the identity", () => {
    for (const principle of ["differential_pressure", "thermal"] as const) {
      const there = densityCorrection({ quantity: { value: 1000, unit: "ft/min" }, principle, from: "ashrae", to: kg(0.95) });
      const back = densityCorrection({ quantity: there.corrected as { value: number; unit: "ft/min" }, principle, from: kg(0.95), to: "ashrae" });
      expect(back.corrected.value).toBeCloseTo(1000, 9);
    }
  });
  it("the velocity of a mean pressure exceeds the mean of the velocities (Jensen's inequality)", () => {
    const pressures = [12, 33, 58, 71];
    const mean = weightedMean(pressures.map((pressure) => velocityFromPressure(pressure, 1.2)), [1, 1, 1, 1]);
    expect(velocityFromPressure(weightedMean(pressures, [1, 1, 1, 1]), 1.2)).toBeGreaterThan(mean);
  });
});
