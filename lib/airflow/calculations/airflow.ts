import { resolveAir } from "../air/resolveAir";
import type { Check } from "../checks/check";
import { runChecks } from "../checks/runChecks";
import { area } from "../duct/area";
import { insideDuct } from "../duct/insideDuct";
import { minimumPoints } from "../layout/minimumPoints";
import type { Air, AnswerOptions, Design, Duct, Instrument, LayoutRule, NegativeReadings, Probe, Readings, Site, StandardAirName, UncertaintyOptions } from "../types";
import { uncertaintyBudget, type Budget } from "../uncertainty/budget";
import { inAnswerUnits } from "../units/convert";
import type { QuantityOf } from "../units/units";
import { traverseVelocity } from "../velocity/traverseVelocity";
import type { WorkingStep } from "../working/working";
import { addAirWorking, airAnswer, ratio, type AirAnswer } from "./airAnswer";
import { designAnswer, type DesignAnswer } from "./designAnswer";
import { addDuctWorking } from "./ductArea";
import { resolveOptions, workingPart, type ResolvedOptions } from "./options";
import { addUncertaintyWorking, uncertaintyAnswer, type UncertaintyAnswer } from "./uncertaintyAnswer";
import { addVelocityWorking, velocityAnswer, type VelocityAnswer } from "./velocityAnswer";

export interface AirflowInput extends AnswerOptions {
  duct: Duct;
  readings: Readings;
  air?: Air;
  standardAir?: StandardAirName;
  probe?: Probe;
  instrument?: Instrument;
  layout?: LayoutRule;
  site?: Site;
  design?: Design;
  uncertainty?: UncertaintyOptions;
  negativeReadings?: NegativeReadings;
}
export interface AirflowAnswer extends VelocityAnswer {
  airflow: { actual: QuantityOf<"airflow">; standard: QuantityOf<"airflow">; mass: QuantityOf<"massFlow"> };
  area: QuantityOf<"area">;
  air: AirAnswer;
  checks: Check[];
  uncertainty: UncertaintyAnswer;
  design: DesignAnswer | null;
  working?: WorkingStep[];
}

/** Airflow in SI: Q = A V̄ in m³/s, ṁ = ρ Q in kg/s, Q_std = ρ Q / ρ_std in m³/s. */
interface Flow {
  area: number;
  averageVelocity: number;
  actual: number;
  mass: number;
  standard: number;
}

/**
 * Airflow of a traverse: actual, standard and mass, with checks, uncertainty and the verdict against design.
 * @param input As the API takes it.
 * @returns As the API gives it, in the units asked for.
 * @throws {AirflowInputError} A duct, air or readings that cannot be, or a layout that is not for ducts of that shape.
 * @example airflow({ duct: { shape: "rectangular", measured: "inside", width: { value: 0.5, unit: "m" }, height: { value: 0.4, unit: "m" } }, readings: { kind: "velocity", unit: "m/s", lines: [[4, 6]] }, units: "si" }).airflow.actual // { value: 1000, unit: "L/s" }
 */
export function airflow(input: AirflowInput): AirflowAnswer {
  const options = resolveOptions(input);
  const { system, working, standardDensity } = options;
  const { readings, probe, instrument, site, layout } = input;
  const inside = insideDuct(input.duct);
  const leastPoints = layout ? minimumPoints(inside, layout, site) : null;
  const air = resolveAir(input.air, standardDensity);
  const traverse = traverseVelocity(readings, air, standardDensity, input);
  const ductArea = area(inside);
  const actual = ductArea * traverse.average;
  const flow: Flow = { area: ductArea, averageVelocity: traverse.average, actual, mass: air.density * actual, standard: (air.density * actual) / standardDensity };
  const budgetOf = (basis: "actual" | "standard"): Budget =>
    uncertaintyBudget({ readings, traverse, air, inside, instrument, site, layout, airWasGiven: input.air !== undefined, basis, minimumPoints: leastPoints, options: input.uncertainty ?? {} });
  const budget = budgetOf("actual");
  const designBudget = input.design?.basis === "standard" ? budgetOf("standard") : budget;
  if (working) {
    addDuctWorking(working, input.duct, inside, system);
    addAirWorking(working, air, options);
    addVelocityWorking(working, readings, traverse, air, probe, system);
    addFlowWorking(flow, air.density, options);
    addUncertaintyWorking(working, budget, "actual");
    if (designBudget !== budget) addUncertaintyWorking(working, designBudget, "standard");
  }
  return {
    airflow: {
      actual: inAnswerUnits("airflow", flow.actual, system),
      standard: inAnswerUnits("airflow", flow.standard, system),
      mass: inAnswerUnits("massFlow", flow.mass, system),
    },
    ...velocityAnswer(traverse, system),
    area: inAnswerUnits("area", flow.area, system),
    air: airAnswer(air, options),
    checks: runChecks({ readings, traverse, air, system, instrument, probe, inside, site, layout, minimumPoints: leastPoints }),
    uncertainty: uncertaintyAnswer(budget, flow.actual, system),
    design: input.design ? designAnswer(input.design, flow, designBudget, options) : null,
    ...workingPart(working),
  };
}

function addFlowWorking(flow: Flow, density: number, { working, system, standardDensity }: ResolvedOptions): void {
  const actual = inAnswerUnits("airflow", flow.actual, system);
  const rho = inAnswerUnits("density", density, system);
  working?.add({
    step: "Airflow, actual",
    equation: "Q = A V̄",
    inputs: { A: inAnswerUnits("area", flow.area, system), "V̄": inAnswerUnits("velocity", flow.averageVelocity, system) },
    value: actual,
    source: "Continuity",
  });
  working?.add({ step: "Mass flow", equation: "ṁ = ρ Q", inputs: { ρ: rho, Q: actual }, value: inAnswerUnits("massFlow", flow.mass, system), source: "Continuity" });
  working?.add({
    step: "Airflow, standard",
    equation: "Q_std = ρ Q / ρ_std",
    inputs: { ρ: rho, Q: actual, ρ_std: inAnswerUnits("density", standardDensity, system), "ρ / ρ_std": ratio(density / standardDensity) },
    value: inAnswerUnits("airflow", flow.standard, system),
    source: "Conservation of mass",
  });
}
