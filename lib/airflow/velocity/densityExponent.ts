import type { Instrument, Readings } from "../types";

/**
 * The power of density that the velocity goes with, V ∝ ρ^e: −½ where it follows from a pressure, −1 from a thermal
 * instrument, 0 from a vane or where no principle is known. Airflow goes with the same power; standard and mass
 * airflow with one more.
 * @param readings What was read.
 * @param instrument What it was read with.
 * @returns e, without unit.
 * @example densityExponent({ kind: "velocity_pressure", unit: "Pa", lines: [[60]] }, undefined) // -0.5
 * @see Bernoulli's equation (pressure); conservation of mass flux (thermal).
 */
export function densityExponent(readings: Readings, instrument: Instrument | undefined): number {
  if (readings.kind === "velocity_pressure" || instrument?.principle === "differential_pressure") return -0.5;
  return instrument?.principle === "thermal" ? -1 : 0;
}
