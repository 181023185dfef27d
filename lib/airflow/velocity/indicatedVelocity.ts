import type { InstrumentPrinciple } from "../types";

/**
 * Factor from what an instrument indicates to the actual velocity (or airflow), by its principle. An instrument that
 * senses differential pressure and assumed density ρ₀ gives √(ρ₀ / ρ); a thermal one that reads standard velocity ρ₀ / ρ;
 * a rotating vane, or an instrument that already compensates, 1.
 * @param principle How the instrument senses velocity.
 * @param assumedDensity ρ₀ in kg/m³.
 * @param density ρ in kg/m³.
 * @returns Factor, without unit.
 * @example indicationFactor("thermal", 1.2, 1.0) // 1.2
 * @see Bernoulli's equation (differential pressure); conservation of mass flux (thermal).
 */
export function indicationFactor(principle: InstrumentPrinciple, assumedDensity: number, density: number): number {
  switch (principle) {
    case "differential_pressure":
      return Math.sqrt(assumedDensity / density);
    case "thermal":
      return assumedDensity / density;
    case "rotating_vane":
      return 1;
  }
}

/** The equation behind `indicationFactor`, as a reader writes it. */
export const INDICATION_EQUATION = {
  differential_pressure: "V = V_ind √(ρ₀ / ρ)",
  thermal: "V = V_ind ρ₀ / ρ",
  rotating_vane: "V = V_ind",
} as const;
