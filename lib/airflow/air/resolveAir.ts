import { AirflowInputError, type Path } from "../errors";
import type { Air, AirState } from "../types";
import { toSi } from "../units/convert";
import { humidAirDensity } from "./humidAir";
import { resolveHumidity } from "./resolveHumidity";
import { resolvePressure } from "./resolvePressure";

/** What the engine took for granted because the caller did not say. */
export type Assumption = "standard_air" | "dry_air" | "sea_level";

/** The air in the duct, in SI. */
export interface ResolvedAir {
  /** kg/m³. */
  density: number;
  /** Pa, barometric plus duct static; null where only the density is known. */
  absolutePressure: number | null;
  /** kg/kg; null where only the density is known. */
  humidityRatio: number | null;
  /** What it was resolved from; null where only the density is known, or where nothing is. */
  state: AirState | null;
  assumed: Assumption[];
}

/** As a request's −40 °C and 200 °C come to kelvin: −40 + 273.15 is just below 233.15 in binary. */
const COLDEST = toSi("temperature", { value: -40, unit: "degC" });
const HOTTEST = toSi("temperature", { value: 200, unit: "degC" });
const LEAST_DENSITY = 0.2;
const GREATEST_DENSITY = 2.5;

/**
 * The density of the air in the duct and what it follows from.
 * @param air Dry bulb −40 to 200 °C, absolute pressure 50 to 120 kPa; or a known density of 0.2 to 2.5 kg/m³. Left out: standard air.
 * @param standardDensity Density in kg/m³ that is assumed where no air is described.
 * @param path Where the air stands in the caller's input.
 * @returns Density, pressure and humidity in SI, and what was assumed.
 * @throws {AirflowInputError} Outside the range, or a state that cannot be; names the field.
 * @example resolveAir({ density: { value: 1.1, unit: "kg/m3" } }, 1.2).density // 1.1
 */
export function resolveAir(air: Air | undefined, standardDensity: number, path: Path = ["air"]): ResolvedAir {
  if (!air) return { density: standardDensity, absolutePressure: null, humidityRatio: null, state: null, assumed: ["standard_air"] };
  if ("density" in air) {
    return { density: knownDensity(toSi("density", air.density), [...path, "density"]), absolutePressure: null, humidityRatio: null, state: null, assumed: [] };
  }
  return resolveState(air, path);
}

function resolveState(air: AirState, path: Path): ResolvedAir {
  const dryBulb = toSi("temperature", air.dryBulb);
  if (!(dryBulb >= COLDEST && dryBulb <= HOTTEST)) {
    throw new AirflowInputError({ path: [...path, "dryBulb"], code: "temperature_out_of_range", detail: "The dry bulb is outside −40 to 200 °C (−40 to 392 °F), where the equations of humid air hold. Check the unit." });
  }
  const pressure = resolvePressure(air, path);
  const humidity = resolveHumidity(air, dryBulb, pressure.absolute, path);
  return {
    density: humidAirDensity(dryBulb, humidity.ratio, pressure.absolute),
    absolutePressure: pressure.absolute,
    humidityRatio: humidity.ratio,
    state: air,
    assumed: [...(humidity.assumedDry ? (["dry_air"] as const) : []), ...(pressure.assumedSeaLevel ? (["sea_level"] as const) : [])],
  };
}

/**
 * Checks a density that the caller knows.
 * @param density In kg/m³, 0.2 to 2.5.
 * @param path Where it stands in the caller's input.
 * @returns The same density in kg/m³.
 * @throws {AirflowInputError} No air between −40 and 200 °C and 50 and 120 kPa has it.
 * @example knownDensity(1.1, ["air", "density"]) // 1.1
 */
export function knownDensity(density: number, path: Path): number {
  if (density >= LEAST_DENSITY && density <= GREATEST_DENSITY) return density;
  throw new AirflowInputError({ path, code: "density_out_of_range", detail: `A density of ${LEAST_DENSITY} to ${GREATEST_DENSITY} kg/m³ (0.0125 to 0.156 lb/ft³) is taken. Check the unit.` });
}
