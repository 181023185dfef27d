import { openCase, type Case, type CaseInput } from "../reconciliation/case";
import { explain, type Conclusion, type Explained } from "../reconciliation/explain";
import { assumptionsOf, type Finding } from "../reconciliation/judge";
import { inOrder, type ReportedFigure } from "../reconciliation/reported";
import { NOTHING_CARRIED, reproduce, type Reproduction } from "../reconciliation/reproduce";
import type { FigureName, Slip } from "../reconciliation/slip";
import { airflowOn, areaOn, averageOn, rightWorksheet } from "../reconciliation/worksheet";
import type { AnswerOptions, StandardAirName } from "../types";
import { inAnswerUnits } from "../units/convert";
import type { WorkingStep } from "../working/working";
import { addAirWorking, ratio } from "./airAnswer";
import { addDuctWorking } from "./ductArea";
import { resolveOptions, workingPart, type ResolvedOptions } from "./options";
import { addVelocityWorking } from "./velocityAnswer";

export type ReconciliationInput = CaseInput & AnswerOptions & { standardAir?: StandardAirName };

export interface FigureAnswer {
  figure: FigureName;
  reported: number;
  recomputed: number;
  /** Reported less recomputed. */
  difference: number;
  /** Unit of the three; null for a count. */
  unit: string | null;
  /** Half the step of the last digit reported. */
  rounding: number;
  withinRounding: boolean;
}

export interface ExplanationAnswer extends Slip {
  /** A second slip that is needed as well, or early rounding beneath the first. */
  also: Slip[];
  /** Disagreeing figures that it reproduces. */
  explains: FigureName[];
  /** Every figure as it comes out with the slip, in the unit reported. */
  figures: { figure: FigureName; value: number }[];
  /** What ranks: one for each slip, one more where a reading or figure had to be picked to fit. */
  assumptions: number;
  rank: number;
  /** Whether another explanation has the same rank. */
  tied: boolean;
}

export interface ReconciliationAnswer {
  figures: FigureAnswer[];
  conclusion: Conclusion;
  /** The conclusion in words. */
  detail: string;
  explanations: ExplanationAnswer[];
  /** Further explanations that were found and are left out, for there are too many; beyond two thousand none is looked for. */
  omitted: number;
  working?: WorkingStep[];
}

const MOST_EXPLANATIONS = 100;

/**
 * Compares what somebody reported of a traverse with its readings, and looks for the slips that would explain a difference.
 * @throws {AirflowInputError} Readings, duct or air that cannot be, or a report that cannot be compared with them.
 */
export function reconciliation(input: ReconciliationInput): ReconciliationAnswer {
  const options = resolveOptions(input);
  const one = openCase(input, options.standardDensity, options.system);
  const exact = reproduce(one, rightWorksheet(one), NOTHING_CARRIED);
  const figures = inOrder(one.figures).map((reported, index) => figureAnswer(reported, exact[index]!));
  const explained = explain(one);
  if (options.working) addReconciliationWorking(one, input, figures, options);
  return {
    figures,
    conclusion: explained.conclusion,
    detail: inWords(explained),
    explanations: ranked(explained.findings),
    omitted: Math.max(0, explained.findings.length - MOST_EXPLANATIONS),
    ...workingPart(options.working),
  };
}

const figureAnswer = ({ figure, value, unit, rounding }: ReportedFigure, { value: recomputed, reproduced }: Reproduction): FigureAnswer => ({
  figure, reported: value, recomputed, difference: value - recomputed, unit, rounding, withinRounding: reproduced,
});

/** Findings come best first; those that explain as much by as few assumptions share a rank. The best hundred are told. */
function ranked(findings: readonly Finding[]): ExplanationAnswer[] {
  const merits = findings.map((finding) => `${finding.explains.length} ${assumptionsOf(finding)}`);
  return findings.slice(0, MOST_EXPLANATIONS).map((finding, index) => {
    const { slips, explains, reproductions } = finding;
    return {
      ...slips.at(-1)!,
      also: slips.slice(0, -1),
      explains,
      figures: reproductions.map(({ figure, value }) => ({ figure, value })),
      assumptions: assumptionsOf(finding),
      rank: merits.indexOf(merits[index]!) + 1,
      tied: merits.indexOf(merits[index]!) !== merits.lastIndexOf(merits[index]!),
    };
  });
}

function inWords({ conclusion, findings, pairs }: Explained): string {
  switch (conclusion) {
    case "agrees":
      return "Every reported figure agrees with the readings within the rounding of its digits.";
    case "explained":
      return findings.length === 1 ? "One explanation accounts for everything that disagrees." : `${findings.length} explanations account for everything that disagrees; the figures cannot tell those of one rank apart.`;
    case "explained_by_two_slips":
      return `No single slip accounts for everything that disagrees; ${findings.length === 1 ? "one pair of slips does" : `${findings.length} pairs of slips do`}.${pairs === "perhaps_chance" ? " Neither slip of a pair explains anything by itself, so this may be chance." : ""}`;
    case "partly_explained":
      return `${NOT_EXPLAINED[pairs]} What is listed explains a part of it.`;
    case "unexplained":
      return `${NOT_EXPLAINED[pairs]} Compare the sheet with the instrument's memory, or read again.`;
  }
}

const NOT_EXPLAINED: Partial<Record<Explained["pairs"], string>> = {
  not_tried: "No single slip accounts for everything that disagrees; pairs are not tried for so many readings.",
  none: "No slip or pair of slips known here accounts for everything that disagrees.",
  too_many: "No single slip accounts for everything that disagrees, and so many pairs of slips would that none of them tells anything.",
};

function addReconciliationWorking(one: Case, input: ReconciliationInput, figures: readonly FigureAnswer[], options: ResolvedOptions): void {
  const { working, system } = options;
  if (!working) return;
  if (input.duct && one.inside) addDuctWorking(working, input.duct, one.inside, system);
  addAirWorking(working, one.air, options);
  addVelocityWorking(working, input.readings, one.traverse, one.air, input.probe, system);
  if (one.figures.airflow) addAirflowStep(one, options);
  for (const { figure, reported, recomputed, difference, unit } of figures) {
    const inUnit = (value: number): { value: number; unit: string } => (unit === null ? ratio(value) : { value, unit });
    working.add({ step: `Difference of the ${figure}`, equation: "reported − recomputed", inputs: { reported: inUnit(reported), recomputed: inUnit(recomputed) }, value: inUnit(difference), source: "Definition" });
  }
}

function addAirflowStep(one: Case, { working, system }: ResolvedOptions): void {
  const sheet = rightWorksheet(one);
  const squareMetres = areaOn(one, sheet)!;
  working?.add({
    step: `Airflow, ${one.basis}`,
    equation: one.basis === "actual" ? "Q = A V̄" : "Q_std = A V̄ ρ / ρ_std",
    inputs: {
      A: inAnswerUnits("area", squareMetres, system),
      "V̄": inAnswerUnits("velocity", averageOn(one, sheet), system),
      ...(one.basis === "standard" && { "ρ / ρ_std": ratio(sheet.airflowFactor) }),
    },
    value: inAnswerUnits("airflow", airflowOn(one, sheet)!, system),
    source: "Continuity",
  });
}
