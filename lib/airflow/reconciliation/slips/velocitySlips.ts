import { fromSi } from "../../units/convert";
import { ANSWER_UNITS, UNITS } from "../../units/units";
import type { Case } from "../case";
import { methodSlip, type Hypothesis, type SlipFamily } from "../hypothesis";
import { withVelocitiesScaled } from "../worksheet";
import { constantFactor, constantsFor } from "./tradeConstants";

/** The pressures were averaged, and the velocity of their mean taken for the mean of the velocities. */
export const pressuresAveraged: SlipFamily = (one, sheet) =>
  one.readings.kind !== "velocity_pressure" || sheet.pressuresAveraged
    ? []
    : [methodSlip(one, sheet, { ...sheet, pressuresAveraged: true }, "pressures_averaged", "average", "The velocity pressures were averaged instead of the velocities, which gives too much.")];

/** Densities closer than this cannot be told apart in a report. */
const LEAST_DENSITY_DIFFERENCE = 0.0005;

/** Standard air was taken where the air was not, in the velocities or in the change to standard airflow. */
export const densityIgnored: SlipFamily = (one, sheet) => {
  const { air: { density }, standardDensity, readings, traverse: { indicationFactor } } = one;
  if (Math.abs(density / standardDensity - 1) < LEAST_DENSITY_DIFFERENCE) return [];
  const [was, taken] = [density, standardDensity].map((si) => fromSi("density", si, ANSWER_UNITS[one.system].density)) as [{ value: number; unit: string }, { value: number; unit: string }];
  const words = `Standard air, ${taken.value} ${taken.unit}, was taken where the density was ${was.value.toPrecision(4)} ${was.unit}.`;
  const scaled = (factor: number, extra = ""): Hypothesis => methodSlip(one, sheet, withVelocitiesScaled(one, sheet, factor), "density_ignored", "average", words + extra);
  const found: Hypothesis[] = [];
  if (readings.kind === "velocity_pressure") {
    found.push(scaled(Math.sqrt(density / standardDensity)));
    for (const constant of constantsFor(one).filter(({ forStandardAir }) => forStandardAir)) found.push(scaled(constantFactor(constant, density), ` The constant ${constant.value} does that.`));
  } else if (indicationFactor !== null && indicationFactor !== 1) {
    found.push(scaled(1 / indicationFactor));
  }
  if (one.basis === "standard" && sheet.inside) found.push(methodSlip(one, sheet, { ...sheet, airflowFactor: 1 }, "density_ignored", "airflow", "The actual airflow was reported as standard airflow."));
  return found;
};

/** The readings taken to be in another unit of their quantity. */
export const readingUnit: SlipFamily = (one, sheet) => {
  const { kind, unit } = one.readings;
  const units: Record<string, { factor: number }> = kind === "velocity" ? UNITS.velocity : UNITS.pressure;
  return Object.entries(units).flatMap(([other, { factor }]): Hypothesis[] => {
    if (factor === one.readingFactor) return [];
    const changed = withVelocitiesScaled(one, sheet, velocityFactor(one, factor));
    return [methodSlip(one, sheet, changed, "unit_confused", "average", `The readings are in ${unit} and were taken to be in ${other}.`)];
  });
};

const velocityFactor = (one: Case, factor: number): number => (one.readings.kind === "velocity" ? factor / one.readingFactor : Math.sqrt(factor / one.readingFactor));
