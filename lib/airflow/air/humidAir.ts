import psychrolib from "psychrolib";

psychrolib.SetUnitSystem(psychrolib.SI);

const ZERO_CELSIUS = 273.15;
/** R_da as psychrolib has it, in J/(kg K). */
export const DRY_AIR_GAS_CONSTANT = 287.042;

/**
 * Humidity ratio from relative humidity.
 * @param dryBulb In K.
 * @param relativeHumidity As a fraction, 0 to 1.
 * @param pressure Absolute, in Pa.
 * @returns kg of water vapour per kg of dry air.
 * @example humidityRatioFromRelativeHumidity(293.15, 0.5, 101325).toFixed(5) // "0.00726"
 * @see psychrolib; ASHRAE Handbook, Fundamentals 2017, chapter 1, equations 5, 6, 12 and 20.
 */
export const humidityRatioFromRelativeHumidity = (dryBulb: number, relativeHumidity: number, pressure: number): number =>
  relativeHumidity === 0 ? 0 : psychrolib.GetHumRatioFromRelHum(dryBulb - ZERO_CELSIUS, relativeHumidity, pressure);

/**
 * Humidity ratio from the wet-bulb temperature.
 * @param dryBulb In K.
 * @param wetBulb In K, at most the dry bulb.
 * @param pressure Absolute, in Pa.
 * @returns kg of water vapour per kg of dry air.
 * @example humidityRatioFromWetBulb(298.15, 291.15, 101325).toFixed(5) // "0.01002"
 * @see psychrolib; ASHRAE Handbook, Fundamentals 2017, chapter 1, equations 33 and 35.
 */
export const humidityRatioFromWetBulb = (dryBulb: number, wetBulb: number, pressure: number): number =>
  psychrolib.GetHumRatioFromTWetBulb(dryBulb - ZERO_CELSIUS, wetBulb - ZERO_CELSIUS, pressure);

/**
 * Humidity ratio from the dew point.
 * @param dewPoint In K.
 * @param pressure Absolute, in Pa.
 * @returns kg of water vapour per kg of dry air.
 * @example humidityRatioFromDewPoint(283.15, 101325).toFixed(5) // "0.00763"
 * @see psychrolib; ASHRAE Handbook, Fundamentals 2017, chapter 1, equations 5, 6 and 20.
 */
export const humidityRatioFromDewPoint = (dewPoint: number, pressure: number): number =>
  psychrolib.GetHumRatioFromTDewPoint(dewPoint - ZERO_CELSIUS, pressure);

/**
 * Humidity ratio of saturated air.
 * @param dryBulb In K.
 * @param pressure Absolute, in Pa.
 * @returns kg of water vapour per kg of dry air.
 * @example saturationHumidityRatio(293.15, 101325).toFixed(5) // "0.01470"
 * @see psychrolib; ASHRAE Handbook, Fundamentals 2017, chapter 1, equations 5, 6 and 21.
 */
export const saturationHumidityRatio = (dryBulb: number, pressure: number): number => psychrolib.GetSatHumRatio(dryBulb - ZERO_CELSIUS, pressure);

/**
 * Pressure of saturated water vapour, over water above the triple point and over ice below it.
 * @param temperature In K, 173.15 to 473.15.
 * @returns Pressure in Pa.
 * @example saturationPressure(293.15).toFixed(1) // "2338.8"
 * @see psychrolib; ASHRAE Handbook, Fundamentals 2017, chapter 1, equations 5 and 6 (Hyland and Wexler).
 */
export const saturationPressure = (temperature: number): number => psychrolib.GetSatVapPres(temperature - ZERO_CELSIUS);

/**
 * Density of humid air, ρ = (1 + W) / v.
 * @param dryBulb In K, 233.15 to 473.15.
 * @param humidityRatio kg/kg, 0 or more.
 * @param pressure Absolute, in Pa, 50 000 to 120 000.
 * @returns Density in kg/m³, of the mixture.
 * @example humidAirDensity(293.15, 0, 101325).toFixed(4) // "1.2042"
 * @see psychrolib; ASHRAE Handbook, Fundamentals 2017, chapter 1, equations 9 and 26. An ideal mixture: 0.005 to 0.07 % below CIPM-2007.
 */
export function humidAirDensity(dryBulb: number, humidityRatio: number, pressure: number): number {
  const celsius = dryBulb - ZERO_CELSIUS;
  // psychrolib raises a humidity ratio of 0 to 1e-7; dry air has an equation of its own.
  const volume = humidityRatio === 0 ? psychrolib.GetDryAirVolume(celsius, pressure) : psychrolib.GetMoistAirVolume(celsius, humidityRatio, pressure);
  return (1 + humidityRatio) / volume;
}
