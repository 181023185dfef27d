import { possibleSlips, type PossibleSlip } from "../reconciliation/possibleSlips";
import type { CheckFunction } from "./context";

const SLIP_WORDS: Record<string, string> = {
  digit_changed: "one digit was misread",
  digits_swapped: "two digits were swapped",
  digit_dropped: "a digit was left out",
  digit_added: "a digit was added",
  decimal_moved: "the decimal point moved",
};

/** Readings far off their own profile that a single slip of the pen would bring back. */
export const possibleSlip: CheckFunction = ({ readings: { lines, kind, unit } }) => {
  const slips = possibleSlips(lines, kind);
  const passed = slips.length === 0;
  return {
    code: "possible_slip",
    passed,
    severity: "caution",
    detail: passed ? "No reading stands off its neighbours in a way that a slip would explain." : `${slips.map((slip) => inWords(slip, unit)).join(" ")} Look at the sheet, or read the point again.`,
    compared: { quantity: "readings that one slip would bring back to the profile", value: slips.length, limit: 0, unit: null },
    source: "local profile of rows and columns, Student's t; limits are engineering judgement",
    ...(!passed && { at: slips.map(({ line, point }) => ({ line, point })) }),
  };
};

function inWords({ line, point, read, expected, slips }: PossibleSlip, unit: string): string {
  const [nearest] = slips;
  const cause = nearest ? `; ${nearest.value} would fit, if ${SLIP_WORDS[nearest.slip] ?? "a slip was made"}` : "";
  return `Line ${line}, point ${point} reads ${read} ${unit} where about ${expected.toPrecision(3)} is expected${cause}.`;
}
