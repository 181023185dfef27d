import { AirflowInputError, type Path } from "../errors";
import type { AirState } from "../types";
import { toSi } from "../units/convert";
import { standardAtmospherePressure } from "./standardAtmosphere";

const LOWEST_ALTITUDE = -1_000;
const HIGHEST_ALTITUDE = 11_000;
const LEAST_PRESSURE = 50_000;
const GREATEST_PRESSURE = 120_000;

/**
 * Absolute pressure of the air in the duct, barometric plus static, in Pa. The barometric pressure is given, or that of
 * the standard atmosphere at the altitude, or that at sea level.
 * @param air The state that was described.
 * @param path Where it stands in the caller's input.
 * @returns Pressure in Pa, and whether sea level was assumed.
 * @throws {AirflowInputError} Both pressure forms given, or a result outside 50 to 120 kPa.
 * @example resolvePressure({ dryBulb: { value: 20, unit: "degC" } }, ["air"]) // { absolute: 101325, assumedSeaLevel: true }
 */
export function resolvePressure(air: AirState, path: Path): { absolute: number; assumedSeaLevel: boolean } {
  if (air.altitude && air.barometricPressure) {
    throw new AirflowInputError({ path: [...path, "barometricPressure"], code: "two_pressures", detail: "Give either the altitude or the barometric pressure, not both." });
  }
  const barometric = barometricPressure(air, path);
  const source = air.barometricPressure ? "barometricPressure" : air.altitude ? "altitude" : "ductStaticPressure";
  if (source !== "ductStaticPressure") requireRange(barometric, [...path, source]);
  const absolute = barometric + (air.ductStaticPressure ? toSi("pressure", air.ductStaticPressure) : 0);
  requireRange(absolute, [...path, "ductStaticPressure"]);
  return { absolute, assumedSeaLevel: source === "ductStaticPressure" };
}

function barometricPressure(air: AirState, path: Path): number {
  if (air.barometricPressure) return toSi("pressure", air.barometricPressure);
  const altitude = air.altitude ? toSi("length", air.altitude) : 0;
  if (altitude >= LOWEST_ALTITUDE && altitude <= HIGHEST_ALTITUDE) return standardAtmospherePressure(altitude);
  throw new AirflowInputError({
    path: [...path, "altitude"],
    code: "altitude_out_of_range",
    detail: `An altitude of ${LOWEST_ALTITUDE} to ${HIGHEST_ALTITUDE} m is taken. Check the unit.`,
  });
}

function requireRange(pressure: number, path: Path): void {
  if (pressure >= LEAST_PRESSURE && pressure <= GREATEST_PRESSURE) return;
  throw new AirflowInputError({
    path,
    code: "pressure_out_of_range",
    detail: `The absolute pressure comes to ${(pressure / 1000).toPrecision(4)} kPa; 50 to 120 kPa (14.8 to 35.4 inHg) is taken. Check the unit, and that barometric pressure is the station's, not reduced to sea level.`,
  });
}
