import type { Case } from "./case";
import { methodSlips, readingSlips, singleSlips } from "./families";
import type { Hypothesis } from "./hypothesis";
import { assumptionsOf, identityOf, judgeOf, type Finding, type Judge } from "./judge";
import { readingPairs } from "./readingPairs";
import { NOTHING_CARRIED, reproduce } from "./reproduce";
import { dimensionDigits } from "./slips/dimensionDigits";
import { earlyRounding, otherEarlyRounding } from "./slips/earlyRounding";
import type { Slip } from "./slip";
import { rightWorksheet, type Worksheet } from "./worksheet";

/** How far the report could be accounted for. */
export type Conclusion = "agrees" | "explained" | "explained_by_two_slips" | "partly_explained" | "unexplained";

export interface Explained {
  conclusion: Conclusion;
  /** Best first: all of what disagrees before part of it, fewer slips before more. */
  findings: Finding[];
  /**
   * Whether pairs of slips were looked for, and what they are worth: `with_evidence` where one of the two explains a part by
   * itself, `perhaps_chance` where neither does, `too_many` where so many fit that none of them tells anything.
   */
  pairs: "not_needed" | "not_tried" | "none" | "with_evidence" | "perhaps_chance" | "too_many";
}

/** So many pairs in one figure are told at the most; where more fit, two numbers can be found to explain anything. */
const MOST_PAIRS = 5;

/** So many slips in readings are tried together with one in a dimension. */
const MOST_UNDER_DIMENSIONS = 50;

/** Two slips are tried for no more readings than this: more than any traverse has, and each pair costs a search through all of them. */
const MOST_POINTS_FOR_PAIRS = 200;

/**
 * Looks for the slips that explain a report, by as few assumptions as will do: none if rounding accounts for it, then one slip,
 * one slip on top of early rounding, two slips, and last what explains only a part.
 */
export function explain(one: Case): Explained {
  const right = rightWorksheet(one);
  const exact = reproduce(one, right, NOTHING_CARRIED);
  if (exact.every(({ reproduced }) => reproduced)) return { conclusion: "agrees", findings: [], pairs: "not_needed" };
  const judge = judgeOf(one, right);

  const rounded = fewestSlips(earlyRounding(one, right).map((working) => judge(working, working.carried)).filter(isFull));
  if (rounded.length > 0) return { conclusion: "explained", findings: distinct(rounded), pairs: "not_needed" };

  const singles = judged(judge, singleSlips(one, right));
  const full = singles.filter(isFull);
  if (full.length > 0) return { conclusion: "explained", findings: distinct(full), pairs: "not_needed" };

  const partial = distinct(singles);
  const two = one.points.length <= MOST_POINTS_FOR_PAIRS ? twoSlips(one, right, judge, partial) : null;
  if (two && two.findings.length > 0) return two;
  return { conclusion: partial.length > 0 ? "partly_explained" : "unexplained", findings: partial, pairs: two?.pairs ?? "not_tried" };
}

/** One slip on top of early rounding, or else two slips. */
function twoSlips(one: Case, right: Worksheet, judge: Judge, singles: readonly Finding[]): Explained {
  const onRounding = otherEarlyRounding(one, right).flatMap((rounding) => judged(judge, onTopOf(rounding, singleSlips(one, rounding.sheet)))).filter(isFull);
  if (onRounding.length > 0) return { conclusion: "explained", findings: distinct(onRounding), pairs: "not_needed" };
  return { conclusion: "explained_by_two_slips", ...pairsOfSlips(one, right, judge, singles) };
}

const isFull = (finding: Finding | null): finding is Finding => finding?.full === true;

const judged = (judge: Judge, hypotheses: readonly Hypothesis[]): Finding[] => hypotheses.map((hypothesis) => judge(hypothesis)).filter((finding) => finding !== null);

const onTopOf = (first: Hypothesis, seconds: readonly Hypothesis[]): Hypothesis[] => seconds.map(({ slips, sheet }) => ({ slips: [...first.slips, ...slips], sheet }));

/**
 * Two slips that explain everything. Where one of them already explains a part by itself, it has evidence of its own, and
 * only such pairs count; otherwise two slips in one figure are tried.
 */
function pairsOfSlips(one: Case, right: Worksheet, judge: Judge, singles: readonly Finding[]): Pick<Explained, "findings" | "pairs"> {
  const known = new Set(singles.map(identityOf));
  const hasEvidence = ({ slips }: Hypothesis): boolean => slips.some((slip) => known.has(identityOf({ slips: [slip] })));
  const onMethods = methodSlips(one, right).flatMap((first) => {
    const [{ slip, figure }] = first.slips as [Slip];
    const others = methodSlips(one, first.sheet).filter(({ slips: [other] }) => other!.slip !== slip || other!.figure !== figure);
    return onTopOf(first, [...others, ...readingSlips(one, first.sheet)]);
  });
  // A dimension can be tried only once the average fits, so here the reading comes first.
  const onReadings = singles.filter(({ slips: [slip] }) => slip!.at).slice(0, MOST_UNDER_DIMENSIONS).flatMap((first) => onTopOf(first, dimensionDigits(one, first.sheet)));
  const found = judged(judge, [...onMethods, ...onReadings]).filter(isFull);
  const pairs = distinct(found);
  const withEvidence = pairs.filter(hasEvidence);
  if (withEvidence.length > 0) return { findings: withEvidence, pairs: "with_evidence" };
  const inOneFigure = pairs.length > 0 ? pairs : distinct(judged(judge, readingPairs(one, right, MOST_PAIRS)).filter(isFull));
  if (inOneFigure.length > MOST_PAIRS) return { findings: [], pairs: "too_many" };
  return { findings: inOneFigure, pairs: inOneFigure.length > 0 ? "perhaps_chance" : "none" };
}

/** Only the findings with the fewest slips. */
function fewestSlips(findings: Finding[]): Finding[] {
  const fewest = Math.min(...findings.map(({ slips }) => slips.length));
  return findings.filter(({ slips }) => slips.length === fewest);
}

/** One finding for each set of slips, the one that explains most; those that explain most come first, by as few assumptions as may be. */
function distinct(findings: readonly Finding[]): Finding[] {
  const best = new Map<string, Finding>();
  for (const finding of findings) {
    const known = best.get(identityOf(finding));
    if (!known || finding.explains.length > known.explains.length) best.set(identityOf(finding), finding);
  }
  return [...best.values()].sort((first, second) => second.explains.length - first.explains.length || assumptionsOf(first) - assumptionsOf(second));
}
