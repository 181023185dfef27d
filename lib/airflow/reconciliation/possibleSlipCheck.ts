import type { Check } from "../checks/check";
import type { Readings } from "../types";
import { possibleSlips, type PossibleSlip } from "./possibleSlips";

/** The check for readings off the local profile that a single slip would bring back. */
export function possibleSlipCheck(readings: Readings): Check {
  const suspects = possibleSlips(readings.lines, readings.kind);
  return {
    code: "possible_slip",
    passed: suspects.length === 0,
    severity: "caution",
    detail: suspects.length === 0 ? "No reading looks like a slip of the pen." : `${suspects.map((one) => inWords(one, readings.unit)).join(" ")} Read the point again while the probe is still there.`,
    compared: { quantity: "readings off the profile that one slip would bring back", value: suspects.length, limit: 0, unit: null },
    source: "Deleted residuals of rows and columns; common practice, no source for the limit",
    ...(suspects.length > 0 && { at: suspects.map(({ line, point }) => ({ line, point })) }),
  };
}

function inWords({ line, point, read, expected, slips: [nearest] }: PossibleSlip, unit: string): string {
  return `Line ${line}, point ${point} reads ${read} where its neighbours suggest about ${Number(expected.toPrecision(3))} ${unit}; ${WORDS[nearest!.slip]} it would be ${nearest!.value}.`;
}

const WORDS = {
  digit_changed: "with one digit other",
  digits_swapped: "with two digits the other way round",
  digit_dropped: "with a digit less",
  digit_added: "with one more digit",
  decimal_moved: "with the decimal point elsewhere",
} as const;
