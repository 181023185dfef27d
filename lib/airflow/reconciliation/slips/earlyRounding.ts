import { ANSWER_UNITS, UNITS } from "../../units/units";
import type { Case } from "../case";
import { methodSlip, type Hypothesis } from "../hypothesis";
import type { ReportedFigure } from "../reported";
import { ALL_CARRIED, NOTHING_CARRIED, reproduce, type Carried } from "../reproduce";
import { roundTo, significantStep } from "../rounding";
import { DIMENSIONS, type FigureName, type Slip } from "../slip";
import { areaOn, averageOn, withVelocitiesScaled, type Worksheet } from "../worksheet";
import { constantFactor, constantsFor } from "./tradeConstants";

/** A way of working that rounds on the way, with the reported figures it goes on from. */
export interface RoundedWorking extends Hypothesis {
  carried: Carried;
}

/** Densities this near to standard air are worked with its constant. */
const STANDARD_AIR_WITHIN = 0.005;

/**
 * The ways of working that round before the end. Nearest at hand: the reported total, average or area was used for the next
 * figure. Then: an average or area that was not reported, rounded to three to five digits; velocities rounded point by point;
 * a rounded constant.
 */
export const earlyRounding = (one: Case, sheet: Worksheet): RoundedWorking[] => [
  ...reportedGoneOnFrom(one, sheet),
  ...unreportedRounded(one, sheet).map((hypothesis) => ({ ...hypothesis, carried: ALL_CARRIED })),
  ...pointsRounded(one, sheet).map((hypothesis) => ({ ...hypothesis, carried: ALL_CARRIED })),
];

/** Early rounding that a slip may come on top of. Figures that were reported are gone on from in any case. */
export const otherEarlyRounding = (one: Case, sheet: Worksheet): Hypothesis[] => [...unreportedRounded(one, sheet), ...pointsRounded(one, sheet)];

function reportedGoneOnFrom(one: Case, sheet: Worksheet): RoundedWorking[] {
  const worked = new Map(reproduce(one, sheet, NOTHING_CARRIED).map((reproduction) => [reproduction.figure, reproduction]));
  const slips = (names: readonly FigureName[]): Slip[] => names.flatMap((name) => (worked.get(name)?.reproduced ? [roundedSlip(one.figures[name]!, worked.get(name)!.value)] : []));
  return CARRIED_TOGETHER.map((names) => ({ slips: slips(names), sheet, carried: new Set(names) })).filter(({ slips: found }) => found.length > 0);
}

/** Figures that the next ones are worked out from, alone and as they meet in the airflow. */
const CARRIED_TOGETHER: readonly FigureName[][] = [["total"], ["average"], [...DIMENSIONS], ["area"], ["average", "area"], ["total", "area"]];

const roundedSlip = ({ figure, value, unit }: ReportedFigure, read: number): Slip => ({
  slip: "rounded_early", figure, read, used: value, unit, detail: `The ${figure} was rounded to ${value} before it was used further.`,
});

/** Digits that an average or area is rounded to on the way; both at once only finely, or rounding could make up for anything. */
const DIGITS_ALONE = [5, 4, 3];
const DIGITS_TOGETHER = [5, 4];

/** Average or area, or both, rounded on the way, where the report does not show them. */
function unreportedRounded(one: Case, sheet: Worksheet): Hypothesis[] {
  if (!one.figures.airflow || !sheet.inside) return [];
  const averages = (on: Worksheet, digits: readonly number[]): Hypothesis[] => {
    const average = averageOn(one, on);
    return one.figures.average || !(average > 0) ? [] : digits.map((kept) => roundedTo(on, "average", average, one.velocityUnit, UNITS.velocity[one.velocityUnit].factor, kept));
  };
  const areas = (on: Worksheet, digits: readonly number[]): Hypothesis[] => {
    const unit = ANSWER_UNITS[one.system].area;
    return one.figures.area ? [] : digits.map((kept) => roundedTo(on, "area", areaOn(one, on)!, unit, UNITS.area[unit].factor, kept));
  };
  const both = averages(sheet, DIGITS_TOGETHER).flatMap((first) => areas(first.sheet, DIGITS_TOGETHER).map(({ slips, sheet: changed }) => ({ slips: [...first.slips, ...slips], sheet: changed })));
  return [...averages(sheet, DIGITS_ALONE), ...areas(sheet, DIGITS_ALONE), ...both];
}

function roundedTo(sheet: Worksheet, figure: "average" | "area", si: number, unit: string, factor: number, digits: number): Hypothesis {
  const step = significantStep(si / factor, digits) * factor;
  const used = Number((roundTo(si, step) / factor).toPrecision(digits));
  const slip: Slip = { slip: "rounded_early", figure, read: si / factor, used, unit, detail: `The ${figure} was rounded to ${used} ${unit} before it was used further.` };
  return { slips: [slip], sheet: { ...sheet, [figure === "average" ? "averageStep" : "areaStep"]: step } };
}

/** From velocity pressures: velocities rounded point by point to the unit they are written in, a rounded constant, or both. */
function pointsRounded(one: Case, sheet: Worksheet): Hypothesis[] {
  if (one.readings.kind !== "velocity_pressure") return [];
  const step = one.velocityUnit === "ft/min" ? 1 : 0.01;
  const { density } = one.air;
  const isStandard = Math.abs(density / one.standardDensity - 1) <= STANDARD_AIR_WITHIN;
  const constants = [null, ...constantsFor(one).filter(({ forStandardAir }) => isStandard || !forStandardAir)];
  return constants.flatMap((constant) =>
    [false, true].flatMap((pointByPoint) => {
      if (!constant && !pointByPoint) return [];
      const factor = constant ? constantFactor(constant, density) : 1;
      const changed = withVelocitiesScaled(one, sheet, factor, pointByPoint ? step * UNITS.velocity[one.velocityUnit].factor : null);
      const words = [...(constant ? [`The rounded constant ${constant.value} was used`] : []), ...(pointByPoint ? [`${constant ? "and the" : "The"} velocity of each point was rounded to ${step} ${one.velocityUnit}`] : [])];
      return [methodSlip(one, sheet, changed, "rounded_early", "average", `${words.join(" ")}.`)];
    }),
  );
}
