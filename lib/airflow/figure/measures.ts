import type { UnitSystem } from "../units/units";
import { fromSi } from "../units/convert";
import type { InsideDuct } from "../duct/insideDuct";

/** Length unit of a system, and how finely a tape is read in it. */
const TAPE = { ip: { unit: "in", decimals: 2 }, si: { unit: "mm", decimals: 0 } } as const;

/** A length as it is written beside a dimension line, without its unit. */
export const tape = (metres: number, system: UnitSystem): string => fromSi("length", metres, TAPE[system].unit).value.toFixed(TAPE[system].decimals);

/** The unit in words. */
export const TAPE_WORDS: Record<UnitSystem, string> = { ip: "inches", si: "millimetres" };

export const tapeUnit = (system: UnitSystem): string => TAPE[system].unit;

/** A length with its unit. */
export const tapeWithUnit = (metres: number, system: UnitSystem): string => `${tape(metres, system)} ${tapeUnit(system)}`;

/** A duct's inside in words: "rectangular, 24.00 × 16.00 in inside". */
export function insideWords(inside: InsideDuct, system: UnitSystem): string {
  const unit = tapeUnit(system);
  switch (inside.shape) {
    case "rectangular":
      return `rectangular duct, ${tape(inside.width, system)} × ${tape(inside.height, system)} ${unit} inside`;
    case "round":
      return `round duct, ${tape(inside.diameter, system)} ${unit} inside`;
    case "flat_oval":
      return `flat oval duct, ${tape(inside.major, system)} × ${tape(inside.minor, system)} ${unit} inside`;
  }
}
