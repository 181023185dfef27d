import { AirflowInputError, type InputFault, type Path } from "../errors";
import type { Duct } from "../types";
import type { Quantity, LengthUnit } from "../units/units";
import { toSi } from "../units/convert";

/** The inside of a duct, in metres. */
export type InsideDuct =
  | { shape: "rectangular"; width: number; height: number }
  | { shape: "round"; diameter: number }
  | { shape: "flat_oval"; major: number; minor: number };

/** In m. No duct that a probe is pushed through is wider or narrower inside; such a figure is a slip in the unit or the decimal point. */
const LARGEST_DIMENSION = 100;
const SMALLEST_DIMENSION = 0.001;

/**
 * How far the duct's outside stands off its inside on each face: sheet or board, and lining.
 * @param duct A duct, of which only the wall matters.
 * @returns Thickness in m, 0 where no wall is described.
 * @example wallThickness({ shape: "round", measured: "outside", diameter: { value: 560, unit: "mm" }, wall: { thickness: { value: 2, unit: "mm" }, lining: { value: 28, unit: "mm" } } }) // 0.03
 */
export function wallThickness({ wall }: Duct): number {
  const thickness = wall?.thickness ? toSi("length", wall.thickness) : 0;
  const lining = wall?.lining ? toSi("length", wall.lining) : 0;
  return thickness + lining;
}

/**
 * The inside dimensions of a duct. Dimensions measured outside are reduced by twice the wall, sheet or board and lining,
 * on each axis; dimensions measured inside are taken as they are.
 * @param duct Each dimension at most 100 m, and at least 1 mm inside.
 * @param path Where the duct stands in the caller's input.
 * @returns Inside dimensions in m.
 * @throws {AirflowInputError} A dimension is not above 0, outside or inside, or no duct has it; a wall is negative; a flat oval's minor axis exceeds its major.
 * @example insideDuct({ shape: "round", measured: "inside", diameter: { value: 500, unit: "mm" } }) // { shape: "round", diameter: 0.5 }
 */
export function insideDuct(duct: Duct, path: Path = ["duct"]): InsideDuct {
  const wall = checkedWall(duct, path);
  const reduction = duct.measured === "outside" ? 2 * wall : 0;
  const faults: InputFault[] = [];
  const inside = (name: string, dimension: Quantity<LengthUnit>): number => {
    const measured = toSi("length", dimension);
    const fault = dimensionFault(name, dimension, measured, measured - reduction, [...path, name]);
    if (fault) faults.push(fault);
    return measured - reduction;
  };
  const result = insideDimensions(duct, inside);
  if (faults.length === 0 && result.shape === "flat_oval" && result.minor > result.major) {
    faults.push({ path: [...path, "minor"], code: "minor_exceeds_major", detail: "The minor axis of a flat oval is longer than its major axis. Exchange the two." });
  }
  const [first, ...rest] = faults;
  if (first) throw new AirflowInputError(first, ...rest);
  return result;
}

function insideDimensions(duct: Duct, inside: (name: string, dimension: Quantity<LengthUnit>) => number): InsideDuct {
  switch (duct.shape) {
    case "rectangular":
      return { shape: "rectangular", width: inside("width", duct.width), height: inside("height", duct.height) };
    case "round":
      return { shape: "round", diameter: inside("diameter", duct.diameter) };
    case "flat_oval":
      return { shape: "flat_oval", major: inside("major", duct.major), minor: inside("minor", duct.minor) };
  }
}

function checkedWall(duct: Duct, path: Path): number {
  for (const part of ["thickness", "lining"] as const) {
    const quantity = duct.wall?.[part];
    if (quantity && quantity.value < 0) {
      throw new AirflowInputError({ path: [...path, "wall", part], code: "negative_wall", detail: `The wall's ${part} is below 0. Give 0 where there is none.` });
    }
  }
  return wallThickness(duct);
}

function dimensionFault(name: string, given: Quantity<LengthUnit>, measured: number, inside: number, path: Path): InputFault | null {
  const written = `${given.value} ${given.unit}`;
  if (!(measured > 0)) return { path, code: "dimension_not_positive", detail: `The ${name} is ${written}; a dimension must be above 0.` };
  if (measured > LARGEST_DIMENSION) return { path, code: "dimension_too_large", detail: `The ${name} is ${written}; at most ${LARGEST_DIMENSION} m is taken. Check the unit.` };
  if (!(inside > 0)) {
    return { path, code: "inside_dimension_not_positive", detail: `The wall and lining leave nothing of the ${name} of ${written}. Check their thickness and unit.` };
  }
  if (inside < SMALLEST_DIMENSION) return { path, code: "dimension_too_small", detail: `The ${name} of ${written} leaves less than ${1000 * SMALLEST_DIMENSION} mm inside, where no probe enters. Check the unit.` };
  return null;
}
