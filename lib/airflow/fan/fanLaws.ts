/** A fan at one point of its curve, in SI: speed in 1/s, airflow in m³/s, pressure in Pa, power in W, density in kg/m³. */
export interface FanPoint {
  speed: number;
  airflow: number;
  staticPressure: number | null;
  power: number | null;
  density: number;
}

/** How the figures of a fan change between two points, each as new over old. */
export interface FanRatios {
  speed: number;
  airflow: number;
  density: number;
  staticPressure: number;
  power: number;
}

/**
 * Ratios for a fan brought to another airflow, in a system that stays as it is: Q ∝ N, p ∝ ρ N², W ∝ ρ N³.
 * @param airflowRatio Airflow wanted over airflow measured, above 0.
 * @param densityRatio Air density then over air density measured, above 0.
 * @example fanRatios(0.75, 1) // { speed: 0.75, airflow: 0.75, density: 1, staticPressure: 0.5625, power: 0.421875 }
 * @see Fan laws of dimensional similarity, for one fan and one point of its curve: ASHRAE Handbook, HVAC Systems and Equipment, Fans (from memory).
 */
export const fanRatios = (airflowRatio: number, densityRatio: number): FanRatios => ({
  speed: airflowRatio,
  airflow: airflowRatio,
  density: densityRatio,
  staticPressure: densityRatio * airflowRatio ** 2,
  power: densityRatio * airflowRatio ** 3,
});

/**
 * The fan at the ratios found.
 * @example atRatios({ speed: 20, airflow: 2, staticPressure: 300, power: 1000, density: 1.2 }, fanRatios(1.1, 1)).speed // 22
 */
export const atRatios = (fan: FanPoint, ratios: FanRatios): FanPoint => ({
  speed: fan.speed * ratios.speed,
  airflow: fan.airflow * ratios.airflow,
  staticPressure: fan.staticPressure === null ? null : fan.staticPressure * ratios.staticPressure,
  power: fan.power === null ? null : fan.power * ratios.power,
  density: fan.density * ratios.density,
});
