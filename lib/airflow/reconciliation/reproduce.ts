import { UNITS } from "../units/units";
import { area } from "../duct/area";
import type { InsideDuct } from "../duct/insideDuct";
import type { Case } from "./case";
import { inOrder, type ReportedFigure } from "./reported";
import { roundTo } from "./rounding";
import type { DimensionName, FigureName } from "./slip";
import { areaOn, averageOn, totalOn, velocityOfMeanPressure, type Worksheet } from "./worksheet";

/** What a worksheet makes of one reported figure. */
export interface Reproduction {
  figure: FigureName;
  /** In the unit reported; of several ways to it the one nearest to the report. */
  value: number;
  reproduced: boolean;
}

/** Floating point may put a sum a hair beyond the rounding it lies on. */
export const HAIR = 1e-9;

export const isReproduced = (value: number, { value: reported, rounding }: ReportedFigure): boolean =>
  Math.abs(value - reported) <= rounding + HAIR * Math.max(1, Math.abs(reported));

/** Figures whose reported, rounded value may have been carried into the next step instead of the exact one. */
export type Carried = ReadonlySet<FigureName>;
export const NOTHING_CARRIED: Carried = new Set();
export const ALL_CARRIED: Carried = new Set(["total", "average", "width", "height", "diameter", "major", "minor", "area"]);

/**
 * Works a worksheet out and compares it with what was reported.
 * @param carried Whoever works by hand goes on with the figure they wrote down: for these figures both ways are tried,
 * as long as the worksheet reproduces them.
 */
export function reproduce(one: Case, sheet: Worksheet, carried: Carried): Reproduction[] {
  const { figures } = one;
  const found = new Map<FigureName, Reproduction>();
  const compare = (name: FigureName, candidates: readonly number[]): void => {
    const reported = figures[name];
    if (reported) found.set(name, sheet.miswritten.includes(name) ? { figure: name, value: reported.value, reproduced: true } : nearest(reported, candidates));
  };
  const carries = (name: FigureName): boolean => carried.has(name) && found.get(name)?.reproduced === true;

  const total = totalOn(one, sheet);
  compare("total", [total]);
  compare("count", [sheet.count]);
  for (const [name, metres] of dimensionsOf(sheet.inside)) compare(name, [metres]);

  const areas = areaCandidates(one, sheet, carries);
  compare("area", areas);

  const averages = [averageOn(one, sheet)];
  if (carries("total") && total > 0 && totalLeadsToAverage(one, sheet)) averages.push((averages[0]! * figures.total!.value * figures.total!.factor) / total);
  compare("average", averageIsPressure(one) ? [(sheet.weightedReadings / sheet.divisor) * one.readingFactor] : averages);

  if (figures.airflow) {
    const used = averages.map((average) => roundTo(average, sheet.averageStep));
    if (carries("average")) used.push(...carriedAverage(one, sheet));
    const usedAreas = areas.map((squareMetres) => roundTo(squareMetres, sheet.areaStep));
    if (carries("area")) usedAreas.push(figures.area!.value * figures.area!.factor);
    compare("airflow", usedAreas.flatMap((squareMetres) => used.map((average) => squareMetres * average * sheet.airflowFactor)));
  }
  return inOrder(figures).map(({ figure }) => found.get(figure)!);
}

/** The candidate nearest to the report, in its unit. Candidates are in SI. */
function nearest(reported: ReportedFigure, candidates: readonly number[]): Reproduction {
  let value = NaN;
  for (const candidate of candidates) {
    const inUnit = candidate / reported.factor;
    if (!(Math.abs(value - reported.value) <= Math.abs(inUnit - reported.value))) value = inUnit;
  }
  return { figure: reported.figure, value, reproduced: isReproduced(value, reported) };
}

export const averageIsPressure = ({ figures }: Case): boolean => figures.average?.unit != null && figures.average.unit in UNITS.pressure;

/** Whether average = total / count, so that a rounded total shows in the average. */
const totalLeadsToAverage = (one: Case, sheet: Worksheet): boolean =>
  one.equalWeights && !sheet.pressuresAveraged && (one.totalOf === "velocities" || one.readings.kind === "velocity");

/** The reported average as a velocity, where it leads to the airflow. */
function carriedAverage(one: Case, sheet: Worksheet): number[] {
  const si = one.figures.average!.value * one.figures.average!.factor;
  if (!averageIsPressure(one)) return [si];
  return sheet.pressuresAveraged ? [velocityOfMeanPressure(one, sheet, si)] : [];
}

function areaCandidates(one: Case, sheet: Worksheet, carries: (name: FigureName) => boolean): number[] {
  const worked = areaOn(one, sheet);
  if (worked === null) return [];
  const dimensions = dimensionsOf(sheet.inside);
  if (!sheet.inside || dimensions.length === 0 || !dimensions.every(([name]) => carries(name))) return [worked];
  const asReported = Object.fromEntries(dimensions.map(([name]) => [name, one.figures[name]!.value * one.figures[name]!.factor]));
  return [worked, area({ ...sheet.inside, ...asReported } as InsideDuct) * sheet.areaFactor];
}

/** Inside dimensions in m, by name. */
export function dimensionsOf(inside: InsideDuct | null): [DimensionName, number][] {
  if (!inside) return [];
  const { shape: _, ...dimensions } = inside;
  return Object.entries(dimensions) as [DimensionName, number][];
}
