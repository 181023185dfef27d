import { writtenResolution } from "../uncertainty/readingInfluences";

/** Digits that people round a figure to at the least. */
const FEWEST_DIGITS = 3;

/**
 * Half the step of the last digit a number was written with. A JSON number does not show zeros after the decimal point, so
 * 1070 may be 1070.0, 1070 or 107 × 10. A sum of whole readings is exact, so all its digits count. An average, an area or an
 * airflow is rounded as people round, to three digits or more: zeros at the end of a whole number count as rounding as
 * long as three digits are left (2600 means 2595 to 2605, never 2550 to 2650), and a whole number of fewer
 * digits had zeros that do not show (8 means 7.995 to 8.005).
 * @param value As written. @param exact Whether zeros at the end are digits.
 * @returns Half-width, in the unit of the value.
 * @example halfStep(1070.5, false) // 0.05
 */
export function halfStep(value: number, exact: boolean): number {
  const written = writtenResolution([[value]]);
  if (exact || written < 1 || value === 0) return written / 2;
  const coarsest = digitsOf(value) - FEWEST_DIGITS;
  let zeros = 0;
  while (zeros < coarsest && value % 10 ** (zeros + 1) === 0) zeros += 1;
  return 10 ** Math.min(zeros, coarsest) / 2;
}

/**
 * The step that leaves a number of significant digits.
 * @example significantStep(1073.5, 3) // 10
 */
export const significantStep = (value: number, digits: number): number => 10 ** (digitsOf(value) - digits);

/** Digits before the decimal point; 0 or fewer for a number below 1. */
const digitsOf = (value: number): number => Math.floor(Math.log10(Math.abs(value))) + 1;

/** Half a step goes up, also where floating point puts it a hair below. */
export const roundTo = (value: number, step: number | null): number => (step === null ? value : Math.round(value / step + 1e-9) * step);
