import type { Budget, Influence } from "../uncertainty/budget";
import { inAnswerUnits } from "../units/convert";
import type { QuantityOf, UnitSystem } from "../units/units";

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
