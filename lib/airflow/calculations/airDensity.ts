import { resolveAir } from "../air/resolveAir";
import type { Air, AnswerOptions, StandardAirName } from "../types";
import type { WorkingStep } from "../working/working";
import { addAirWorking, airAnswer, type AirAnswer } from "./airAnswer";
import { resolveOptions, workingPart } from "./options";

export interface AirDensityInput extends AnswerOptions {
  air: Air;
  standardAir?: StandardAirName;
}
export type AirDensityAnswer = AirAnswer & { working?: WorkingStep[] };

/**
 * Density of the air in a duct and its ratio to a standard air.
 * @param input As the API takes it.
 * @returns As the API gives it, in the units asked for.
 * @throws {AirflowInputError} A state that cannot be, or one outside −40 to 200 °C and 50 to 120 kPa.
 * @example airDensity({ air: { dryBulb: { value: 20, unit: "degC" }, altitude: { value: 500, unit: "m" } }, units: "si" }).density.value.toFixed(4) // "1.1345"
 */
export function airDensity(input: AirDensityInput): AirDensityAnswer {
  const options = resolveOptions(input);
  const air = resolveAir(input.air, options.standardDensity);
  if (options.working) addAirWorking(options.working, air, options);
  return { ...airAnswer(air, options), ...workingPart(options.working) };
}
