/** US Standard Atmosphere 1976: sea level, the layer up to 11 km, and the Earth it assumes. */
const SEA_LEVEL_PRESSURE = 101_325;
const SEA_LEVEL_TEMPERATURE = 288.15;
const LAPSE_RATE = 0.0065;
const STANDARD_GRAVITY = 9.80665;
const MOLAR_MASS_OF_AIR = 0.0289644;
/** The gas constant that the 1976 standard was computed with, older than today's. */
const GAS_CONSTANT = 8.31432;
const EARTH_RADIUS = 6_356_766;
const EXPONENT = (STANDARD_GRAVITY * MOLAR_MASS_OF_AIR) / (GAS_CONSTANT * LAPSE_RATE);

/**
 * Barometric pressure of the US Standard Atmosphere 1976, p = p₀ (1 − L H / T₀)^(g M / R L), where H = r z / (r + z)
 * is the geopotential altitude of the geometric altitude z that a map or a survey gives.
 * @param altitude Geometric altitude above sea level in m, −1 000 to 11 000.
 * @returns Pressure in Pa.
 * @example standardAtmospherePressure(0) // 101325
 * @see US Standard Atmosphere, 1976 (NOAA, NASA, USAF), equations 18, 23 and 33a.
 */
export function standardAtmospherePressure(altitude: number): number {
  const geopotential = (EARTH_RADIUS * altitude) / (EARTH_RADIUS + altitude);
  return SEA_LEVEL_PRESSURE * (1 - (LAPSE_RATE * geopotential) / SEA_LEVEL_TEMPERATURE) ** EXPONENT;
}
