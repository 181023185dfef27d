const LAPSE_RATE = 0.0065;
const STANDARD_GRAVITY = 9.80665;
const MOLAR_MASS_OF_AIR = 0.0289644;
/** The gas constant that the 1976 standard was computed with, older than today's. */
const GAS_CONSTANT = 8.31432;

/** US Standard Atmosphere 1976, in SI: sea level, the layer up to 11 km, and the Earth it assumes. */
export const STANDARD_ATMOSPHERE = {
  seaLevelPressure: 101_325,
  seaLevelTemperature: 288.15,
  lapseRate: LAPSE_RATE,
  earthRadius: 6_356_766,
  exponent: (STANDARD_GRAVITY * MOLAR_MASS_OF_AIR) / (GAS_CONSTANT * LAPSE_RATE),
} as const;

/**
 * Barometric pressure of the US Standard Atmosphere 1976, p = p₀ (1 − L H / T₀)^(g M / R L), where H = r z / (r + z)
 * is the geopotential altitude of the geometric altitude z that a map or a survey gives.
 * @param altitude Geometric altitude above sea level in m, −1 000 to 11 000.
 * @returns Pressure in Pa.
 * @example standardAtmospherePressure(0) // 101325
 * @see US Standard Atmosphere, 1976 (NOAA, NASA, USAF), equations 18, 23 and 33a.
 */
export function standardAtmospherePressure(altitude: number): number {
  const { seaLevelPressure, seaLevelTemperature, lapseRate, earthRadius, exponent } = STANDARD_ATMOSPHERE;
  const geopotential = (earthRadius * altitude) / (earthRadius + altitude);
  return seaLevelPressure * (1 - (lapseRate * geopotential) / seaLevelTemperature) ** exponent;
}
