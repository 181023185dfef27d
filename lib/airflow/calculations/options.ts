import { defaultStandardAir, STANDARD_AIR_DENSITY } from "../air/standardAir";
import type { AnswerOptions, StandardAirName } from "../types";
import type { UnitSystem } from "../units/units";
import { Working, type WorkingStep } from "../working/working";

/** Options with their defaults filled in. */
export interface ResolvedOptions {
  system: UnitSystem;
  standardAir: StandardAirName;
  /** kg/m³. */
  standardDensity: number;
  working: Working | undefined;
}

export function resolveOptions({ units = "ip", working = false, standardAir }: AnswerOptions & { standardAir?: StandardAirName }): ResolvedOptions {
  const name = standardAir ?? defaultStandardAir(units);
  return { system: units, standardAir: name, standardDensity: STANDARD_AIR_DENSITY[name], working: working ? new Working() : undefined };
}

/** The part of an answer that carries the working, where it was asked for. */
export const workingPart = (working: Working | undefined): { working?: WorkingStep[] } => (working ? { working: working.steps } : {});
