/** Ratio of specific heats of air. */
export const KAPPA = 1.4;
/** The correction is applied where it exceeds this. */
export const COMPRESSIBILITY_THRESHOLD = 0.0005;

/**
 * Velocity from velocity pressure, V = C √(2 p_v / ρ), incompressible.
 * @param velocityPressure In Pa, 0 or more.
 * @param density In kg/m³, above 0.
 * @param coefficient Of the probe; 1 for a standard pitot-static probe.
 * @returns Velocity in m/s.
 * @example velocityFromPressure(60, 1.2) // 10
 * @see Bernoulli's equation; ISO 3966, equation for a Pitot static tube; 40 CFR 60 App. A-1 Method 2 (0.99 standard, 0.84 S-type).
 */
export const velocityFromPressure = (velocityPressure: number, density: number, coefficient = 1): number => coefficient * Math.sqrt((2 * velocityPressure) / density);

/**
 * Compressibility factor (1 − ε) of a pitot-static reading, √(1 − r / 2κ + (κ − 1) r² / 6κ²), where r = p_v / p.
 * @param velocityPressure In Pa, 0 or more.
 * @param absolutePressure Static, absolute, in Pa.
 * @returns Factor on the velocity, at most 1.
 * @example compressibilityFactor(0, 101325) // 1
 * @see ISO 3966, correction for compressibility (form from memory); within 1e-5 of the isentropic equation at 40 m/s.
 */
export function compressibilityFactor(velocityPressure: number, absolutePressure: number): number {
  const ratio = velocityPressure / absolutePressure;
  return Math.sqrt(1 - ratio / (2 * KAPPA) + ((KAPPA - 1) / (6 * KAPPA * KAPPA)) * ratio * ratio);
}

/**
 * The compressibility factor that a reading is corrected by: 1 where the correction would not exceed 0.05 %.
 * @param velocityPressure In Pa, 0 or more.
 * @param absolutePressure Static, absolute, in Pa.
 * @returns Factor on the velocity, at most 1.
 * @example appliedCompressibility(60, 101325) // 1
 */
export function appliedCompressibility(velocityPressure: number, absolutePressure: number): number {
  const factor = compressibilityFactor(velocityPressure, absolutePressure);
  return 1 - factor > COMPRESSIBILITY_THRESHOLD ? factor : 1;
}
