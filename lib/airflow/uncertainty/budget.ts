import type { ResolvedAir } from "../air/resolveAir";
import type { InsideDuct } from "../duct/insideDuct";
import type { Instrument, LayoutRule, Readings, Site, UncertaintyOptions } from "../types";
import type { TraverseVelocity } from "../velocity/traverseVelocity";
import { areaRow, densityRow, layoutRow, siteRow } from "./influences";
import { fluctuationRow, instrumentRow, roundingRow } from "./readingInfluences";

export type InfluenceName = "instrument" | "fluctuation" | "layout" | "site" | "area" | "density" | "rounding";

/** One line of the budget. */
export interface Influence {
  name: InfluenceName;
  /** Relative standard uncertainty of the airflow from this influence, in percent. */
  percent: number;
  origin: "given" | "default";
  detail: string;
}

export interface BudgetInput {
  readings: Readings;
  traverse: TraverseVelocity;
  air: ResolvedAir;
  airWasGiven: boolean;
  /** Which airflow the budget is of; they differ in what density does to them. */
  basis: "actual" | "standard";
  inside: InsideDuct;
  instrument?: Instrument;
  site?: Site;
  layout?: LayoutRule;
  /** Least number of points that the layout's rule asks for; null where no rule is named. */
  minimumPoints: number | null;
  options: UncertaintyOptions;
}

export interface Budget {
  influences: Influence[];
  /** Combined relative standard uncertainty, in percent. */
  combinedPercent: number;
  coverageFactor: number;
  /** Expanded relative uncertainty, in percent. */
  expandedPercent: number;
}

const COVERAGE_FACTOR = 2;

/**
 * The uncertainty budget of an airflow: relative standard uncertainties of independent influences combined in
 * quadrature, u_c² = Σ u_i², and expanded with k = 2 (about 95 %).
 * @param input What was measured, and what is known of it.
 * @returns Each influence and their combination, in percent of the airflow.
 * @throws {AirflowInputError} An accuracy or a half-width that cannot be.
 * @see GUM, ISO/IEC Guide 98-3, 5.1 and 6.2; the influences are those of ISO 3966. Defaults are engineering judgement.
 */
export function uncertaintyBudget(input: BudgetInput): Budget {
  const influences = [instrumentRow(input), fluctuationRow(input), layoutRow(input), siteRow(input), areaRow(input), densityRow(input), roundingRow(input)];
  const combinedPercent = Math.hypot(...influences.map(({ percent }) => percent));
  return { influences, combinedPercent, coverageFactor: COVERAGE_FACTOR, expandedPercent: COVERAGE_FACTOR * combinedPercent };
}
