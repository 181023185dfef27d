import { requireWithin } from "../errors";
import type { Design } from "../types";
import type { Budget } from "../uncertainty/budget";
import { verdict, type Verdict } from "../uncertainty/verdict";
import { inAnswerUnits, toSi } from "../units/convert";
import type { QuantityOf, UnitSystem } from "../units/units";
import type { Working } from "../working/working";
import type { ResolvedOptions } from "./options";

export interface DesignAnswer {
  airflow: QuantityOf<"airflow">;
  basis: "actual" | "standard";
  /** Measured over design, in percent. */
  percent: number;
  difference: QuantityOf<"airflow">;
  tolerancePercent: number;
  expandedUncertainty: QuantityOf<"airflow">;
  verdict: Verdict;
}

const DEFAULT_TOLERANCE_PERCENT = 10;
/** In m³/s. */
const DESIGN_LIMITS = [1e-6, 1e6] as const;

/**
 * Measured airflow against design, on the basis that the design names.
 * @throws {AirflowInputError} A design airflow that is not above 0, or that no duct carries.
 */
export function designAnswer(design: Design, measured: { actual: number; standard: number }, budget: Budget, { system, working }: ResolvedOptions): DesignAnswer {
  const target = requireWithin(toSi("airflow", design.airflow), DESIGN_LIMITS, {
    path: ["design", "airflow"], code: "design_out_of_range", detail: "A design airflow of 0.000001 to 1,000,000 m³/s is taken. Check the unit.",
  });
  const basis = design.basis ?? "actual";
  const flow = measured[basis];
  const tolerancePercent = design.tolerancePercent ?? DEFAULT_TOLERANCE_PERCENT;
  const expanded = (flow * budget.expandedPercent) / 100;
  const percent = (100 * flow) / target;
  const airflow = (cubicMetresPerSecond: number): QuantityOf<"airflow"> => inAnswerUnits("airflow", cubicMetresPerSecond, system);
  const tolerance = (target * tolerancePercent) / 100;
  if (working) addDesignWorking(working, { flow, target, tolerancePercent, expandedPercent: budget.expandedPercent }, system);
  return {
    airflow: airflow(target),
    basis,
    percent,
    difference: airflow(flow - target),
    tolerancePercent,
    expandedUncertainty: airflow(expanded),
    verdict: verdict(flow, target, expanded, tolerance),
  };
}

interface Comparison {
  flow: number;
  target: number;
  tolerancePercent: number;
  expandedPercent: number;
}

function addDesignWorking(working: Working, { flow, target, tolerancePercent, expandedPercent }: Comparison, system: UnitSystem): void {
  const airflow = (cubicMetresPerSecond: number): QuantityOf<"airflow"> => inAnswerUnits("airflow", cubicMetresPerSecond, system);
  const percent = (value: number): QuantityOf<"ratio"> => ({ value, unit: "percent" });
  const [Q, Q_d, U] = [airflow(flow), airflow(target), percent(expandedPercent)];
  const difference = Math.abs(flow - target);
  const uncertainty = (flow * expandedPercent) / 100;
  working.add({ step: "Percent of design", equation: "100 Q / Q_d", inputs: { Q, Q_d }, value: percent((100 * flow) / target), source: "Definition" });
  working.add({ step: "Tolerance", equation: "T = Q_d × tolerance", inputs: { Q_d, tolerance: percent(tolerancePercent) }, value: airflow((target * tolerancePercent) / 100), source: "The design's tolerance" });
  working.add({ step: "Difference with the uncertainty added", equation: "|Q − Q_d| + U Q", inputs: { Q, Q_d, U }, value: airflow(difference + uncertainty), source: "JCGM 106, guard band of U: within where this is at most T" });
  working.add({ step: "Difference with the uncertainty taken off", equation: "|Q − Q_d| − U Q", inputs: { Q, Q_d, U }, value: airflow(difference - uncertainty), source: "JCGM 106, guard band of U: outside where this exceeds T, otherwise undecided" });
}
