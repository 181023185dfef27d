import { DRY_AIR_GAS_CONSTANT, saturationPressure } from "../air/humidAir";
import type { Assumption, ResolvedAir } from "../air/resolveAir";
import { STANDARD_ATMOSPHERE } from "../air/standardAtmosphere";
import type { AirState, StandardAirName } from "../types";
import { inAnswerUnits, toSi } from "../units/convert";
import type { Quantity, QuantityOf, UnitSystem } from "../units/units";
import type { Working } from "../working/working";
import type { ResolvedOptions } from "./options";

const FREEZING = 273.15;
const HANDBOOK = "ASHRAE Handbook, Fundamentals 2017, chapter 1";

/** The air as every answer gives it. */
export interface AirAnswer {
  density: QuantityOf<"density">;
  /** Density over that of the standard air. */
  densityRatio: number;
  standardAir: { name: StandardAirName; density: QuantityOf<"density"> };
  absolutePressure: QuantityOf<"pressure"> | null;
  humidityRatio: number | null;
  /** Of the mixture: volume per mass of humid air. */
  specificVolume: QuantityOf<"specificVolume">;
  assumed: Assumption[];
}

export const airAnswer = (air: ResolvedAir, { system, standardAir, standardDensity }: ResolvedOptions): AirAnswer => ({
  density: inAnswerUnits("density", air.density, system),
  densityRatio: air.density / standardDensity,
  standardAir: { name: standardAir, density: inAnswerUnits("density", standardDensity, system) },
  absolutePressure: air.absolutePressure === null ? null : inAnswerUnits("absolutePressure", air.absolutePressure, system),
  humidityRatio: air.humidityRatio,
  specificVolume: inAnswerUnits("specificVolume", 1 / air.density, system),
  assumed: air.assumed,
});

type Ratio = Quantity<"1">;

/** A bare ratio, with the unit that UCUM gives it. */
export const ratio = (value: number): Ratio => ({ value, unit: "1" });

/** The steps from the state of the air to its density, and on to its ratio to the standard air. */
export function addAirWorking(working: Working, air: ResolvedAir, { system, standardDensity }: ResolvedOptions): void {
  const density = inAnswerUnits("density", air.density, system);
  if (air.state && air.absolutePressure !== null && air.humidityRatio !== null) {
    const { dryBulb } = air.state;
    const p = inAnswerUnits("absolutePressure", air.absolutePressure, system);
    const W = ratio(air.humidityRatio);
    addPressureWorking(working, air.state, air.absolutePressure, system);
    addHumidityWorking(working, air.state, air.absolutePressure, W, system);
    working.add({
      step: "Density",
      equation: "ρ = p (1 + W) / (R_da T (1 + 1.607858 W))",
      inputs: { p, W, T: { value: toSi("temperature", dryBulb), unit: "K" }, R_da: { value: DRY_AIR_GAS_CONSTANT, unit: "J/(kg K)" } },
      value: density,
      source: `${HANDBOOK}, equations 9 and 26, through psychrolib`,
    });
  }
  working.add({
    step: "Density ratio",
    equation: "d = ρ / ρ_std",
    inputs: { ρ: density, ρ_std: inAnswerUnits("density", standardDensity, system) },
    value: ratio(air.density / standardDensity),
    source: "Definition",
  });
}

function addPressureWorking(working: Working, { altitude, barometricPressure, ductStaticPressure }: AirState, absolute: number, system: UnitSystem): void {
  const pressure = (pascals: number): QuantityOf<"pressure"> => inAnswerUnits("absolutePressure", pascals, system);
  const gauge = ductStaticPressure ? toSi("pressure", ductStaticPressure) : 0;
  if (!barometricPressure) {
    const { seaLevelPressure, seaLevelTemperature, lapseRate, earthRadius, exponent } = STANDARD_ATMOSPHERE;
    working.add({
      step: "Barometric pressure",
      equation: "p_b = p₀ (1 − L H / T₀)^n, H = r z / (r + z)",
      inputs: {
        z: altitude ?? { value: 0, unit: "m" },
        "p₀": pressure(seaLevelPressure),
        L: { value: lapseRate, unit: "K/m" },
        "T₀": { value: seaLevelTemperature, unit: "K" },
        n: ratio(exponent),
        r: { value: earthRadius, unit: "m" },
      },
      value: pressure(absolute - gauge),
      source: altitude ? "US Standard Atmosphere 1976" : "US Standard Atmosphere 1976; sea level was assumed",
    });
  }
  working.add({
    step: "Absolute pressure",
    equation: "p = p_b + p_s",
    inputs: { p_b: barometricPressure ?? pressure(absolute - gauge), p_s: ductStaticPressure ?? inAnswerUnits("pressure", 0, system) },
    value: pressure(absolute),
    source: "Definition: barometric and duct static pressure",
  });
}

/** From the form of humidity that was given to the humidity ratio; nothing where that was given, or dry air was assumed. */
function addHumidityWorking(working: Working, state: AirState, absolute: number, W: Ratio, system: UnitSystem): void {
  const p = inAnswerUnits("absolutePressure", absolute, system);
  const pressure = (pascals: number): QuantityOf<"pressure"> => inAnswerUnits("pressure", pascals, system);
  const saturation = (symbol: string, temperature: QuantityOf<"temperature">): number => {
    const pascals = saturationPressure(toSi("temperature", temperature));
    working.add({ step: "Saturation pressure", equation: `p_ws(${symbol})`, inputs: { [symbol]: temperature }, value: pressure(pascals), source: `Hyland and Wexler; ${HANDBOOK}, equations 5 and 6, through psychrolib` });
    return pascals;
  };
  const fromVapour = (pascals: number): void =>
    working.add({ step: "Humidity ratio", equation: "W = 0.621945 p_w / (p − p_w)", inputs: { p_w: pressure(pascals), p }, value: W, source: `${HANDBOOK}, equation 20, through psychrolib` });

  if (state.relativeHumidity) {
    const saturated = saturation("t", state.dryBulb);
    const vapour = toSi("ratio", state.relativeHumidity) * saturated;
    working.add({ step: "Vapour pressure", equation: "p_w = φ p_ws", inputs: { φ: state.relativeHumidity, p_ws: pressure(saturated) }, value: pressure(vapour), source: `${HANDBOOK}, equation 12` });
    fromVapour(vapour);
  } else if (state.dewPoint) {
    fromVapour(saturation("t_d", state.dewPoint));
  } else if (state.wetBulb) {
    addWetBulbWorking(working, state.dryBulb, state.wetBulb, saturation("t*", state.wetBulb), absolute, W, system);
  }
}

function addWetBulbWorking(working: Working, dryBulb: QuantityOf<"temperature">, wetBulb: QuantityOf<"temperature">, saturated: number, absolute: number, W: Ratio, system: UnitSystem): void {
  const saturatedRatio = ratio((0.621945 * saturated) / (absolute - saturated));
  working.add({
    step: "Humidity ratio saturated at the wet bulb",
    equation: "W_s* = 0.621945 p_ws / (p − p_ws)",
    inputs: { p_ws: inAnswerUnits("pressure", saturated, system), p: inAnswerUnits("absolutePressure", absolute, system) },
    value: saturatedRatio,
    source: `${HANDBOOK}, equation 20, through psychrolib`,
  });
  const aboveFreezing = toSi("temperature", wetBulb) >= FREEZING;
  working.add({
    step: "Humidity ratio",
    equation: aboveFreezing
      ? "W = ((2501 − 2.326 t*) W_s* − 1.006 (t − t*)) / (2501 + 1.86 t − 4.186 t*), t in °C"
      : "W = ((2830 − 0.24 t*) W_s* − 1.006 (t − t*)) / (2830 + 1.86 t − 2.1 t*), t in °C",
    inputs: { t: dryBulb, "t*": wetBulb, "W_s*": saturatedRatio },
    value: W,
    source: `${HANDBOOK}, equation ${aboveFreezing ? 33 : 35}, through psychrolib`,
  });
}
