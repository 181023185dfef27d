import { resolveAir } from "../air/resolveAir";
import { STANDARD_AIR_DENSITY } from "../air/standardAir";
import { requireWithin } from "../errors";
import type { Air, AnswerOptions, InstrumentPrinciple, StandardAirName } from "../types";
import { inAnswerUnits, toSi } from "../units/convert";
import { UNITS, type AirflowUnit, type Quantity, type QuantityOf, type VelocityUnit } from "../units/units";
import { INDICATION_EQUATION, indicationFactor } from "../velocity/indicatedVelocity";
import type { WorkingStep } from "../working/working";
import { resolveOptions, workingPart, type ResolvedOptions } from "./options";

export interface DensityCorrectionInput extends AnswerOptions {
  /** What the instrument indicated. */
  quantity: Quantity<VelocityUnit | AirflowUnit>;
  principle: InstrumentPrinciple;
  /** The air the instrument assumed. */
  from: Air | StandardAirName;
  /** The air that was there. */
  to: Air | StandardAirName;
}
export interface DensityCorrectionAnswer {
  corrected: QuantityOf<"velocity"> | QuantityOf<"airflow">;
  factor: number;
  fromDensity: QuantityOf<"density">;
  toDensity: QuantityOf<"density">;
  working?: WorkingStep[];
}

/** In m/s or m³/s. */
const INDICATION_LIMITS = [-1e6, 1e6] as const;

/**
 * Corrects an indicated velocity or airflow from the air that the instrument assumed to the air that was there.
 * @param input As the API takes it.
 * @returns As the API gives it, in the units asked for.
 * @throws {AirflowInputError} A state of air that cannot be, or an indication that no instrument gives.
 * @example densityCorrection({ quantity: { value: 10, unit: "m/s" }, principle: "thermal", from: "iso", to: { density: { value: 1, unit: "kg/m3" } }, units: "si" }).corrected // { value: 12, unit: "m/s" }
 */
export function densityCorrection(input: DensityCorrectionInput): DensityCorrectionAnswer {
  const options = resolveOptions(input);
  const { system, working } = options;
  const from = densityOf(input.from, options, "from");
  const to = densityOf(input.to, options, "to");
  const factor = indicationFactor(input.principle, from, to);
  const kind = input.quantity.unit in UNITS.velocity ? "velocity" : "airflow";
  const indicated = requireWithin(toSi(kind, input.quantity as QuantityOf<typeof kind>), INDICATION_LIMITS, {
    path: ["quantity"], code: "quantity_out_of_range", detail: "At most 1,000,000 m/s or m³/s is taken. Check the unit.",
  });
  const corrected = inAnswerUnits(kind, indicated * factor, system);
  const fromDensity = inAnswerUnits("density", from, system);
  const toDensity = inAnswerUnits("density", to, system);
  const symbol = kind === "velocity" ? "V" : "Q";
  working?.add({
    step: "Density correction",
    equation: INDICATION_EQUATION[input.principle].replaceAll("V", symbol),
    inputs: { [`${symbol}_ind`]: inAnswerUnits(kind, indicated, system), "ρ₀": fromDensity, ρ: toDensity },
    value: corrected,
    source: "Bernoulli's equation for differential pressure, mass flux for a thermal instrument",
  });
  return { corrected, factor, fromDensity, toDensity, ...workingPart(working) };
}

const densityOf = (air: Air | StandardAirName, { standardDensity }: ResolvedOptions, field: string): number =>
  typeof air === "string" ? STANDARD_AIR_DENSITY[air] : resolveAir(air, standardDensity, [field]).density;
