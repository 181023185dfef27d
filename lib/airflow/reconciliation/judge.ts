import type { Case } from "./case";
import { DIGIT_SLIPS } from "./digitVariants";
import type { Hypothesis } from "./hypothesis";
import { ALL_CARRIED, NOTHING_CARRIED, reproduce, type Carried, type Reproduction } from "./reproduce";
import { DIMENSIONS, type FigureName, type SlipName } from "./slip";
import type { Worksheet } from "./worksheet";

/** A hypothesis that accounts for part or all of what disagrees, and spoils nothing that agrees. */
export interface Finding extends Hypothesis {
  /** The disagreeing figures that it reproduces. */
  explains: FigureName[];
  /** Whether these are all of them. */
  full: boolean;
  reproductions: Reproduction[];
}

/** Tells whether a hypothesis helps; null where it does not. */
export type Judge = (hypothesis: Hypothesis, carried?: Carried) => Finding | null;

/**
 * A judge of hypotheses on one report. What follows from a rounded figure that was itself reported counts as explained
 * only if the hypothesis brings something to light that rounding does not.
 */
export function judgeOf(one: Case, right: Worksheet): Judge {
  const exact = reproduce(one, right, NOTHING_CARRIED);
  const disagreeing = namesWhere(exact, false);
  const agreeing = namesWhere(exact, true);
  const byRounding = namesWhere(reproduce(one, right, ALL_CARRIED), true);
  return (hypothesis, carried = ALL_CARRIED) => {
    const reproductions = reproduce(one, hypothesis.sheet, carried);
    const reproduced = namesWhere(reproductions, true);
    const explains = disagreeing.filter((name) => reproduced.includes(name));
    const helps = carried === ALL_CARRIED ? explains.some((name) => !byRounding.includes(name)) : explains.length > 0;
    if (!helps || !agreeing.every((name) => reproduced.includes(name))) return null;
    return { ...hypothesis, explains, full: explains.length === disagreeing.length, reproductions };
  };
}

const namesWhere = (reproductions: readonly Reproduction[], reproduced: boolean): FigureName[] =>
  reproductions.filter((one) => one.reproduced === reproduced).map(({ figure }) => figure);

/** What tells one slip from another, whichever way it was found. Of a slip in the method the number is a result, not a choice. */
export const identityOf = ({ slips }: Pick<Hypothesis, "slips">): string =>
  slips.map(({ slip, at, figure, used }) => [slip, at?.line, at?.point, figure, isChosen(slip) ? used : ""].join(" ")).sort().join(" + ");

const isChosen = (slip: SlipName): boolean => slip === "wrong_count" || (DIGIT_SLIPS as readonly SlipName[]).includes(slip);

/** Slips that can be made only one way, once the duct, the air and the readings are there. */
const WITHOUT_CHOICE: readonly SlipName[] = ["outside_for_inside", "wall_subtracted_once", "radius_for_diameter", "area_conversion", "pressures_averaged", "density_ignored", "unit_confused", "rounded_early"];

/**
 * How much has to be assumed: one for each slip, and one more where it could have been made at many readings or figures, so that
 * one of them had to be picked to fit.
 */
export const assumptionsOf = ({ slips }: Pick<Hypothesis, "slips">): number =>
  slips.reduce((sum, { slip, figure }) => sum + (WITHOUT_CHOICE.includes(slip) && !(DIMENSIONS as readonly (FigureName | undefined)[]).includes(figure) ? 1 : 2), 0);
