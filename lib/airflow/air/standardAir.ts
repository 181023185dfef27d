import type { StandardAirName } from "../types";
import { toSi } from "../units/convert";
import type { UnitSystem } from "../units/units";
import { humidAirDensity } from "./humidAir";

const dryAt = (celsius: number, pascals: number): number => humidAirDensity(celsius + 273.15, 0, pascals);

/**
 * Densities of the standard airs in kg/m³. `ashrae` and `iso` are densities by definition; `epa` and `normal` are
 * states (dry air at 68 °F and 29.92 inHg; at 0 °C and 101.325 kPa) whose density the engine computes.
 * @see ASHRAE and AMCA: 0.075 lb/ft³. ISO 5801: 1.2 kg/m³ (from memory). 40 CFR 60.2: 68 °F, 29.92 inHg. DIN 1343: 0 °C, 101.325 kPa.
 */
export const STANDARD_AIR_DENSITY: Record<StandardAirName, number> = {
  ashrae: toSi("density", { value: 0.075, unit: "lb/ft3" }),
  iso: 1.2,
  epa: dryAt(20, toSi("pressure", { value: 29.92, unit: "inHg" })),
  normal: dryAt(0, 101_325),
};

/**
 * The standard air that is meant where none is named.
 * @param system Units of the answer.
 * @returns Its name.
 * @example defaultStandardAir("si") // "iso"
 */
export const defaultStandardAir = (system: UnitSystem): StandardAirName => (system === "ip" ? "ashrae" : "iso");
