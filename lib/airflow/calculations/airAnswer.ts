import type { Assumption, ResolvedAir } from "../air/resolveAir";
import type { StandardAirName } from "../types";
import { inAnswerUnits } from "../units/convert";
import type { QuantityOf } from "../units/units";
import type { Working } from "../working/working";
import type { ResolvedOptions } from "./options";

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

/** The steps from the state of the air to its density. */
export function addAirWorking(working: Working, air: ResolvedAir, { system, standardDensity }: ResolvedOptions): void {
  const density = inAnswerUnits("density", air.density, system);
  if (air.absolutePressure !== null && air.humidityRatio !== null && air.dryBulb !== null) {
    const pressure = inAnswerUnits("absolutePressure", air.absolutePressure, system);
    const state = { t: inAnswerUnits("temperature", air.dryBulb, system), p: pressure };
    working.add({ step: "Humidity ratio", equation: "W = 0.621945 p_w / (p − p_w)", inputs: state, value: ratio(air.humidityRatio), source: "ASHRAE Handbook, Fundamentals 2017, chapter 1, equation 20, through psychrolib" });
    working.add({ step: "Density", equation: "ρ = p (1 + W) / (R_da T (1 + 1.607858 W))", inputs: { ...state, W: ratio(air.humidityRatio) }, value: density, source: "ASHRAE Handbook, Fundamentals 2017, chapter 1, equations 9 and 26, through psychrolib" });
  }
  working.add({
    step: "Density ratio",
    equation: "d = ρ / ρ_std",
    inputs: { ρ: density, ρ_std: inAnswerUnits("density", standardDensity, system) },
    value: ratio(air.density / standardDensity),
    source: "Definition",
  });
}

/** A bare ratio, with the unit that UCUM gives it. */
export const ratio = (value: number): { value: number; unit: string } => ({ value, unit: "1" });

