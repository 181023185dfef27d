import { describe, expect, it } from "vitest";
import { airflow } from "@/lib/airflow/calculations/airflow";
import { verdict } from "@/lib/airflow/uncertainty/verdict";
import { published, reference, relative } from "./values";

const { gum_example: example, formulas } = reference["8_uncertainty"];
const { inputs, components_relative_standard: parts, rho, q_m3_s, u_c_rel, monte_carlo } = example;

/** From a standard uncertainty to the half-width of the rectangular distribution that has it. */
const HALF_WIDTH = Math.sqrt(3);

/** Probability below z of a standard normal distribution, by Simpson's rule from −8. */
function normalProbability(z: number): number {
  const [from, steps] = [-8, 2000];
  const width = (z - from) / steps;
  const density = (x: number): number => Math.exp(-(x ** 2) / 2) / Math.sqrt(2 * Math.PI);
  let sum = density(from) + density(z);
  for (let step = 1; step < steps; step += 1) sum += (step % 2 === 1 ? 4 : 2) * density(from + step * width);
  return (sum * width) / 3;
}

const answer = airflow({
  duct: { shape: "round", measured: "inside", diameter: { value: inputs.D_m, unit: "m" } },
  readings: { kind: "velocity_pressure", unit: "Pa", lines: [inputs.dp_Pa.slice(0, 10), inputs.dp_Pa.slice(10)] },
  air: { density: { value: rho, unit: "kg/m3" } },
  instrument: { principle: "differential_pressure", accuracy: { percentOfReading: 100 * inputs.u_gain_rel * HALF_WIDTH, absolute: { value: inputs.u_offset_Pa * HALF_WIDTH, unit: "Pa" } } },
  uncertainty: {
    dimension: { value: inputs.u_D * HALF_WIDTH, unit: "m" },
    densityPercent: 100 * Math.hypot(inputs.u_T / inputs.T_K, inputs.u_p / inputs.p_Pa),
    layoutPercent: 100 * inputs.u_method_rel, sitePercent: 0, fluctuationPercent: 100 * inputs.u_noise_rel_each, resolution: 0,
  },
  units: "si",
});
const percentOf = (name: string): number => answer.uncertainty.budget.find((row) => row.name === name)!.percent;

describe(`a traverse by the GUM (${example.status})`, () => {
  it("airflow", () => expect(relative(answer.airflow.actual.value / 1000, q_m3_s)).toBeLessThan(1e-12));
  it("area: 2 u(D) / D", () => expect(relative(percentOf("area"), 100 * parts.D)).toBeLessThan(1e-12));
  it("layout", () => expect(percentOf("layout")).toBeCloseTo(100 * parts["traverse method / number of points"], 12));
  it("instrument: gain halved, and a common zero offset by ½ mean(p^−½) / mean(p^½)", () => {
    expect(relative(percentOf("instrument"), 100 * Math.hypot(parts["dp gain (common to all readings)"], parts["dp zero offset (common)"]))).toBeLessThan(1e-9);
  });
  it("density: half of temperature and pressure", () => {
    expect(relative(percentOf("density"), 100 * Math.hypot(parts["T (via rho)"], parts["p (via rho)"]))).toBeLessThan(1e-9);
  });
  it("fluctuation: ½ u √Σp / Σ√p, independent at each of the unequal readings", () => {
    expect(relative(percentOf("fluctuation"), 100 * parts["dp reading noise (independent)"])).toBeLessThan(1e-9);
  });

  // The engine's budget has no row for the probe's coefficient, so the example's 0.5 % is added here.
  const withCoefficient = Math.hypot(answer.uncertainty.combinedPercent / 100, parts.C);
  it("combined, with the coefficient's share", () => expect(relative(withCoefficient, u_c_rel)).toBeLessThan(1e-9));
  // A standard deviation from n draws is itself uncertain by 1/√(2n), 0.11 % here.
  it(`combined, against ${monte_carlo.draws} Monte Carlo draws`, () => expect(relative(withCoefficient, monte_carlo.rel_sd)).toBeLessThan(0.0022));
  it(`rows combine in quadrature and expand with k = 2 ${published(formulas, "GUM propagation").citation}`, () => {
    const combined = Math.hypot(...answer.uncertainty.budget.map(({ percent }) => percent));
    expect(answer.uncertainty.combinedPercent).toBeCloseTo(combined, 12);
    expect(answer.uncertainty.expandedPercent).toBeCloseTo(2 * combined, 12);
  });
});

interface Risk {
  PFA_at_limit_w_0: number;
  PFA_at_limit_w_2u: number;
  example: { T_L: number; T_U: number; y: number; u: number; p_conform: number; A_L_w2u: number; A_U_w2u: number };
}
const risk = published<Risk>(formulas, "risk at the limit");

describe("the verdict's guard band, w = U = 2u", () => {
  it(`is accepted up to the limit less U, rejected beyond the limit plus U ${published(formulas, "guard band (JCGM 106, ILAC-G8)").citation}`, () => {
    expect([90, 93, 94, 107, 108, 113, 114].map((airflowMeasured) => verdict(airflowMeasured, 100, 3, 10))).toEqual(["undecided", "within", "within", "within", "undecided", "undecided", "outside"]);
  });

  // In hundredths: limits 95 and 105, u 1.5, acceptance limits 98 and 102.
  const { T_L, T_U, y, u, p_conform, A_L_w2u, A_U_w2u } = risk.value.example;
  const at = (measured: number) => verdict(Math.round(100 * measured), 100, 200 * u, Math.round(100 * (T_U - 1)));
  it(`has its acceptance limits at ${A_L_w2u} and ${A_U_w2u} of the design ${risk.citation}`, () => {
    expect([A_L_w2u - 0.01, A_L_w2u, A_U_w2u, A_U_w2u + 0.01].map(at)).toEqual(["undecided", "within", "within", "undecided"]);
  });
  it(`accepts wrongly at most 2.3 times in a hundred, there ${risk.citation}`, () => {
    expect(at(y)).toBe("within");
    const conforms = normalProbability((T_U - y) / u) - normalProbability((T_L - y) / u);
    expect(conforms).toBeCloseTo(p_conform, 8);
    expect(1 - conforms).toBeLessThan(risk.value.PFA_at_limit_w_2u + 1e-5);
    expect(normalProbability(-2)).toBeCloseTo(risk.value.PFA_at_limit_w_2u, 9);
  });
  it(`rejects wrongly as seldom: just beyond the limit plus U ${risk.citation}`, () => {
    const rejected = T_U + 2 * u + 0.01;
    expect(at(rejected)).toBe("outside");
    expect(normalProbability((T_U - rejected) / u)).toBeLessThan(risk.value.PFA_at_limit_w_2u);
  });
  it(`leaves undecided what simple acceptance would get wrong half the time, at the limit itself ${risk.citation}`, () => {
    expect(at(T_U)).toBe("undecided");
    expect(normalProbability(0)).toBeCloseTo(risk.value.PFA_at_limit_w_0, 9);
  });
});
