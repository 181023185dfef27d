import type { Budget, Influence } from "../uncertainty/budget";
import { inAnswerUnits } from "../units/convert";
import type { QuantityOf, UnitSystem } from "../units/units";
import type { Working } from "../working/working";
import { ratio } from "./airAnswer";

export interface UncertaintyAnswer {
  budget: Influence[];
  combinedPercent: number;
  coverageFactor: number;
  expandedPercent: number;
  /** Of the actual airflow. */
  expanded: QuantityOf<"airflow">;
  note: string;
}

const NOTE = "Relative standard uncertainties of independent influences, combined in quadrature and expanded with k = 2 (about 95 %). Rows of origin default are engineering judgement.";

export const uncertaintyAnswer = (budget: Budget, actual: number, system: UnitSystem): UncertaintyAnswer => ({
  budget: budget.influences,
  combinedPercent: budget.combinedPercent,
  coverageFactor: budget.coverageFactor,
  expandedPercent: budget.expandedPercent,
  expanded: inAnswerUnits("airflow", (actual * budget.expandedPercent) / 100, system),
  note: NOTE,
});

/** The steps from the rows of a budget to the expanded uncertainty. */
export function addUncertaintyWorking(working: Working, { influences, combinedPercent, coverageFactor, expandedPercent }: Budget, basis: string): void {
  const percent = (value: number): QuantityOf<"ratio"> => ({ value, unit: "percent" });
  working.add({
    step: `Combined uncertainty of the ${basis} airflow`,
    equation: "u = √(Σ u_i²)",
    inputs: Object.fromEntries(influences.map((influence) => [`u_${influence.name}`, percent(influence.percent)])),
    value: percent(combinedPercent),
    source: "GUM, ISO/IEC Guide 98-3, 5.1: relative standard uncertainties of independent influences",
  });
  working.add({
    step: `Expanded uncertainty of the ${basis} airflow`,
    equation: "U = k u",
    inputs: { k: ratio(coverageFactor), u: percent(combinedPercent) },
    value: percent(expandedPercent),
    source: "GUM, ISO/IEC Guide 98-3, 6.2: k = 2, about 95 %",
  });
}
