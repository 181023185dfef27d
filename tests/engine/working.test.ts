import { describe, expect, it } from "vitest";
import { airDensity } from "@/lib/airflow/calculations/airDensity";
import { airflow, type AirflowInput } from "@/lib/airflow/calculations/airflow";
import { averageVelocity } from "@/lib/airflow/calculations/averageVelocity";
import { densityCorrection } from "@/lib/airflow/calculations/densityCorrection";
import { ductArea } from "@/lib/airflow/calculations/ductArea";
import type { Air, Duct, Readings } from "@/lib/airflow/types";
import { UNITS } from "@/lib/airflow/units/units";
import type { WorkingStep } from "@/lib/airflow/working/working";

type Quantity = { value: number; unit: string };
/** What a reader with a pocket calculator makes of an equation, from the inputs beside it, in SI. */
type ByHand = (x: Record<string, number>) => number;

const { sqrt, exp, log, abs, PI } = Math;

/** Saturation pressure of Hyland and Wexler, in Pa at K, written from the published coefficients. */
const saturation = (T: number): number =>
  T <= 273.16
    ? exp(-5674.5359 / T + 6.3925247 - 9.677843e-3 * T + 6.2215701e-7 * T ** 2 + 2.0747825e-9 * T ** 3 - 9.484024e-13 * T ** 4 + 4.1635019 * log(T))
    : exp(-5800.2206 / T + 1.3914993 - 0.048640239 * T + 4.1764768e-5 * T ** 2 - 1.4452093e-8 * T ** 3 + 6.5459673 * log(T));
const celsius = (kelvin: number): number => kelvin - 273.15;

/** Every equation that a working may show. One that is missing here fails the test. */
const BY_HAND: Record<string, ByHand> = {
  "w = w_outside − 2 t": ({ w_outside, t }) => w_outside! - 2 * t!,
  "h = h_outside − 2 t": ({ h_outside, t }) => h_outside! - 2 * t!,
  "D = D_outside − 2 t": ({ D_outside, t }) => D_outside! - 2 * t!,
  "a = a_outside − 2 t": ({ a_outside, t }) => a_outside! - 2 * t!,
  "b = b_outside − 2 t": ({ b_outside, t }) => b_outside! - 2 * t!,
  "A = w h": ({ w, h }) => w! * h!,
  "A = π D² / 4": ({ D }) => (PI * D! ** 2) / 4,
  "A = π b² / 4 + b (a − b)": ({ a, b }) => (PI * b! ** 2) / 4 + b! * (a! - b!),
  "P = 2 (w + h)": ({ w, h }) => 2 * (w! + h!),
  "P = π D": ({ D }) => PI * D!,
  "P = π b + 2 (a − b)": ({ a, b }) => PI * b! + 2 * (a! - b!),
  "D_h = 4 A / P": ({ A, P }) => (4 * A!) / P!,
  "p_b = p₀ (1 − L H / T₀)^n, H = r z / (r + z)": (x) => x["p₀"]! * (1 - (x.L! * ((x.r! * x.z!) / (x.r! + x.z!))) / x["T₀"]!) ** x.n!,
  "p = p_b + p_s": ({ p_b, p_s }) => p_b! + p_s!,
  "p_ws(t)": ({ t }) => saturation(t!),
  "p_ws(t_d)": ({ t_d }) => saturation(t_d!),
  "p_ws(t*)": (x) => saturation(x["t*"]!),
  "p_w = φ p_ws": ({ φ, p_ws }) => φ! * p_ws!,
  "W = 0.621945 p_w / (p − p_w)": ({ p, p_w }) => (0.621945 * p_w!) / (p! - p_w!),
  "W_s* = 0.621945 p_ws / (p − p_ws)": ({ p, p_ws }) => (0.621945 * p_ws!) / (p! - p_ws!),
  "W = ((2501 − 2.326 t*) W_s* − 1.006 (t − t*)) / (2501 + 1.86 t − 4.186 t*), t in °C": (x) => {
    const [t, wet] = [celsius(x.t!), celsius(x["t*"]!)];
    return ((2501 - 2.326 * wet) * x["W_s*"]! - 1.006 * (t - wet)) / (2501 + 1.86 * t - 4.186 * wet);
  },
  "W = ((2830 − 0.24 t*) W_s* − 1.006 (t − t*)) / (2830 + 1.86 t − 2.1 t*), t in °C": (x) => {
    const [t, wet] = [celsius(x.t!), celsius(x["t*"]!)];
    return ((2830 - 0.24 * wet) * x["W_s*"]! - 1.006 * (t - wet)) / (2830 + 1.86 * t - 2.1 * wet);
  },
  "ρ = p (1 + W) / (R_da T (1 + 1.607858 W))": ({ p, T, W, R_da }) => (p! * (1 + W!)) / (R_da! * T! * (1 + 1.607858 * W!)),
  "d = ρ / ρ_std": ({ ρ, ρ_std }) => ρ! / ρ_std!,
  "x = max(0, gain × reading + offset)": ({ gain, reading, offset }) => Math.max(0, gain! * reading! + offset!),
  "V = C √(2 p_v / ρ)": ({ C, p_v, ρ }) => C! * sqrt((2 * p_v!) / ρ!),
  "V = C (1 − ε) √(2 p_v / ρ), (1 − ε)² = 1 − r / 2κ + (κ − 1) r² / 6κ², r = p_v / p": ({ C, p_v, ρ, p, κ }) => {
    const r = p_v! / p!;
    return C! * sqrt(1 - r / (2 * κ!) + ((κ! - 1) * r ** 2) / (6 * κ! ** 2)) * sqrt((2 * p_v!) / ρ!);
  },
  "V = V_ind": ({ V_ind }) => V_ind!,
  "V = V_ind √(ρ₀ / ρ)": (x) => x.V_ind! * sqrt(x["ρ₀"]! / x["ρ"]!),
  "V = V_ind ρ₀ / ρ": (x) => (x.V_ind! * x["ρ₀"]!) / x["ρ"]!,
  "Q = Q_ind √(ρ₀ / ρ)": (x) => x.Q_ind! * sqrt(x["ρ₀"]! / x["ρ"]!),
  "V̄ = Σ V / n": (x) => x["Σ V"]! / x.n!,
  "V̄ = Σ w V / Σ w": (x) => x["Σ w V"]! / x["Σ w"]!,
  "Q = A V̄": (x) => x.A! * x["V̄"]!,
  "ṁ = ρ Q": ({ ρ, Q }) => ρ! * Q!,
  "Q_std = ρ Q / ρ_std": ({ ρ, Q, ρ_std }) => (ρ! * Q!) / ρ_std!,
  "u = √(Σ u_i²)": (x) => sqrt(Object.values(x).reduce((sum, one) => sum + one ** 2, 0)),
  "U = k u": ({ k, u }) => k! * u!,
  "100 Q / Q_d": ({ Q, Q_d }) => Q! / Q_d!,
  "T = Q_d × tolerance": ({ Q_d, tolerance }) => Q_d! * tolerance!,
  "|Q − Q_d| + U Q": ({ Q, Q_d, U }) => abs(Q! - Q_d!) + U! * Q!,
  "|Q − Q_d| − U Q": ({ Q, Q_d, U }) => abs(Q! - Q_d!) - U! * Q!,
};

/** SI factors of the units that only a working has. */
const CONSTANT_UNITS: Record<string, { factor: number; offset: number }> = { "1": { factor: 1, offset: 0 }, "K/m": { factor: 1, offset: 0 }, "J/(kg K)": { factor: 1, offset: 0 } };
const BY_UNIT: Record<string, { factor: number; offset: number }> = { ...CONSTANT_UNITS, ...Object.assign({}, ...Object.values(UNITS)) };

function si({ value, unit }: Quantity): number {
  const definition = BY_UNIT[unit];
  if (!definition) throw new Error(`The working uses the unit ${unit}, which nobody defines.`);
  return value * definition.factor + definition.offset;
}

function redo({ equation, inputs }: WorkingStep): number {
  const byHand = BY_HAND[equation];
  if (!byHand) throw new Error(`Nobody could redo "${equation}".`);
  return byHand(Object.fromEntries(Object.entries(inputs).map(([symbol, input]) => [symbol, si(input)])));
}

const q = <U extends string>(value: number, unit: U) => ({ value, unit });
const PRESSURES: Readings = { kind: "velocity_pressure", unit: "in_wg", lines: [[0.061, 0.074, null], [0.07, -0.004, 0.066]] };
const FAST: Readings = { kind: "velocity_pressure", unit: "Pa", lines: [[900, 1450], [12, 1390]] };
const VELOCITIES: Readings = { kind: "velocity", unit: "ft/min", lines: [[840, 905], [868, 940]] };
const LINED: Duct = { shape: "rectangular", measured: "outside", width: q(26, "in"), height: q(18, "in"), wall: { thickness: q(0.05, "in"), lining: q(1, "in") } };
const ROUND: Duct = { shape: "round", measured: "outside", diameter: q(560, "mm"), wall: { lining: q(28, "mm") } };
const OVAL: Duct = { shape: "flat_oval", measured: "outside", major: q(36, "in"), minor: q(14, "in"), wall: { thickness: q(1, "mm") } };

const AIRS: Record<string, Air> = {
  "relative humidity at an altitude": { dryBulb: q(58, "degF"), relativeHumidity: q(85, "percent"), altitude: q(1640, "ft"), ductStaticPressure: q(1.2, "in_wg") },
  "wet bulb and a barometer": { dryBulb: q(25, "degC"), wetBulb: q(18, "degC"), barometricPressure: q(95.6, "kPa"), ductStaticPressure: q(-310, "Pa") },
  "wet bulb below freezing": { dryBulb: q(-2, "degC"), wetBulb: q(-3, "degC"), barometricPressure: q(29.5, "inHg") },
  "dew point": { dryBulb: q(295, "K"), dewPoint: q(50, "degF"), altitude: q(900, "m") },
  "humidity ratio": { dryBulb: q(80, "degF"), humidityRatio: 0.011 },
  "dry air at sea level, assumed": { dryBulb: q(70, "degF") },
  "known density": { density: q(0.071, "lb/ft3") },
};

const DESIGN: Partial<AirflowInput> = { design: { airflow: q(3100, "ft3/min"), basis: "standard", tolerancePercent: 7 } };
const TRAVERSES: Record<string, AirflowInput> = {
  "velocity pressures, one below zero, against design": { duct: LINED, readings: PRESSURES, air: AIRS["relative humidity at an altitude"], probe: { coefficient: 0.99 }, ...DESIGN },
  "fast air": { duct: ROUND, readings: FAST, air: AIRS["wet bulb and a barometer"] },
  "fast air of known density": { duct: ROUND, readings: FAST, air: AIRS["known density"] },
  "a thermal instrument with a calibration": { duct: OVAL, readings: VELOCITIES, air: AIRS["dew point"], instrument: { principle: "thermal", calibration: { gain: 1.02, offset: -4 } } },
  "a differential pressure instrument": { duct: OVAL, readings: VELOCITIES, instrument: { principle: "differential_pressure", assumedDensity: q(1.2, "kg/m3") }, design: { airflow: q(1.2, "m3/s") } },
  "a vane": { duct: ROUND, readings: VELOCITIES, instrument: { principle: "rotating_vane" } },
  "no instrument named, weights": { duct: ROUND, readings: { ...VELOCITIES, weights: [[1, 2], [3, 1]] } },
};

const SYSTEMS = ["ip", "si"] as const;
const everyStep = SYSTEMS.flatMap((units) => {
  const options = { units, working: true };
  return [
    ...[LINED, ROUND, OVAL].map((duct) => [`${units}, ${duct.shape}`, ductArea({ duct, ...options })] as const),
    ...Object.entries(AIRS).map(([title, air]) => [`${units}, ${title}`, airDensity({ air, ...options })] as const),
    [`${units}, average`, averageVelocity({ readings: PRESSURES, ...options })] as const,
    ...Object.entries(TRAVERSES).map(([title, input]) => [`${units}, ${title}`, airflow({ ...input, ...options })] as const),
    [`${units}, correction of a velocity`, densityCorrection({ quantity: q(1000, "ft/min"), principle: "thermal", from: "ashrae", to: AIRS["dew point"]!, ...options })] as const,
    [`${units}, correction of an airflow`, densityCorrection({ quantity: q(240, "L/s"), principle: "differential_pressure", from: "iso", to: "normal", ...options })] as const,
  ].flatMap(([title, answer]) => answer.working!.map((step) => ({ title: `${title}: ${step.step}`, step })));
});

describe("every step of a working comes out again from its own inputs and equation", () => {
  it.each(everyStep)("$title", ({ step }) => {
    const expected = redo(step);
    expect(Math.abs(si(step.value) - expected)).toBeLessThanOrEqual(1e-9 * Math.max(1e-6, abs(expected)));
  });

  it("uses every equation known here", () => {
    const used = new Set(everyStep.map(({ step }) => step.equation));
    expect(Object.keys(BY_HAND).filter((equation) => !used.has(equation))).toEqual([]);
  });

  it("names what each step takes from an earlier one with the same value", () => {
    const { working } = airflow({ ...TRAVERSES["velocity pressures, one below zero, against design"]!, working: true });
    const valueOf = (name: string): Quantity => working!.find(({ step }) => step === name)!.value;
    const inputOf = (name: string, symbol: string): Quantity => working!.find(({ step }) => step === name)!.inputs[symbol]!;
    expect(inputOf("Airflow, actual", "A")).toEqual(valueOf("Area"));
    expect(inputOf("Airflow, actual", "V̄")).toEqual(valueOf("Average velocity"));
    expect(inputOf("Airflow, standard", "ρ")).toEqual(valueOf("Density"));
    expect(inputOf("Density", "p")).toEqual(valueOf("Absolute pressure"));
    expect(inputOf("Density", "W")).toEqual(valueOf("Humidity ratio"));
    expect(inputOf("Percent of design", "Q")).toEqual(valueOf("Airflow, standard"));
  });
});
