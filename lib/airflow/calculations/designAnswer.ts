import { requireWithin } from "../errors";
import type { Design } from "../types";
import type { Budget } from "../uncertainty/budget";
import { verdict, type Verdict } from "../uncertainty/verdict";
import { inAnswerUnits, toSi } from "../units/convert";
import type { QuantityOf } from "../units/units";
import { ratio } from "./airAnswer";
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
  working?.add({ step: "Percent of design", equation: "100 Q / Q_d", inputs: { Q: airflow(flow), Q_d: airflow(target) }, value: { value: percent, unit: "percent" }, source: "Definition" });
  working?.add({
    step: "Verdict",
    equation: "within: |Q − Q_d| + U ≤ T; outside: |Q − Q_d| − U > T",
    inputs: { "|Q − Q_d|": airflow(Math.abs(flow - target)), U: airflow(expanded), T: airflow((target * tolerancePercent) / 100) },
    value: ratio(percent / 100),
    source: "JCGM 106, guard band of U",
  });
  return {
    airflow: airflow(target),
    basis,
    percent,
    difference: airflow(flow - target),
    tolerancePercent,
    expandedUncertainty: airflow(expanded),
    verdict: verdict(flow, target, expanded, (target * tolerancePercent) / 100),
  };
}
