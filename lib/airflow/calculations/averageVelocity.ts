import { resolveAir } from "../air/resolveAir";
import type { Check } from "../checks/check";
import { runChecks } from "../checks/runChecks";
import type { Air, AnswerOptions, Instrument, NegativeReadings, Probe, Readings, StandardAirName } from "../types";
import { traverseVelocity } from "../velocity/traverseVelocity";
import type { WorkingStep } from "../working/working";
import { addAirWorking, airAnswer, type AirAnswer } from "./airAnswer";
import { resolveOptions, workingPart } from "./options";
import { addVelocityWorking, velocityAnswer, type VelocityAnswer } from "./velocityAnswer";

export interface AverageVelocityInput extends AnswerOptions {
  readings: Readings;
  air?: Air;
  standardAir?: StandardAirName;
  probe?: Probe;
  instrument?: Instrument;
  negativeReadings?: NegativeReadings;
}
export interface AverageVelocityAnswer extends VelocityAnswer {
  air: AirAnswer;
  checks: Check[];
  working?: WorkingStep[];
}

/**
 * Average velocity of a traverse from velocity pressures or indicated velocities.
 * @param input As the API takes it.
 * @returns As the API gives it, in the units asked for.
 * @throws {AirflowInputError} No reading, one out of range, or air that cannot be.
 * @example averageVelocity({ readings: { kind: "velocity_pressure", unit: "Pa", lines: [[60, 15]] }, air: { density: { value: 1.2, unit: "kg/m3" } }, units: "si" }).averageVelocity // { value: 7.5, unit: "m/s" }
 */
export function averageVelocity(input: AverageVelocityInput): AverageVelocityAnswer {
  const options = resolveOptions(input);
  const { system, working, standardDensity } = options;
  const { readings, probe, instrument } = input;
  const air = resolveAir(input.air, standardDensity);
  const traverse = traverseVelocity(readings, air, standardDensity, input);
  if (working) {
    addAirWorking(working, air, options);
    addVelocityWorking(working, readings, traverse, air, probe, system);
  }
  return {
    ...velocityAnswer(traverse, system),
    air: airAnswer(air, options),
    checks: runChecks({ readings, traverse, air, system, instrument, probe }),
    ...workingPart(working),
  };
}
