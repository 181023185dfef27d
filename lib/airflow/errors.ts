/** Where a value stands in a calculation's input, e.g. `["duct", "width"]`. */
export type Path = readonly (string | number)[];

/** One thing wrong with an input: where it is, a code a program can act on, and words a person can. */
export interface InputFault {
  /** Path from the root of the calculation's input. */
  path: Path;
  /** Stable code in snake_case, e.g. `inside_dimension_not_positive`. */
  code: string;
  /** What is wrong, what it means and what to do, in one or two sentences. */
  detail: string;
}

/**
 * Thrown by the engine when an input is well-formed but physically impossible or outside the range
 * in which the equations hold. It always says which input, so the caller can point at it.
 */
export class AirflowInputError extends Error {
  readonly faults: readonly InputFault[];

  constructor(...faults: [InputFault, ...InputFault[]]) {
    super(faults.map((fault) => fault.detail).join(" "));
    this.name = "AirflowInputError";
    this.faults = faults;
  }
}

/**
 * Lets a value through that lies within its limits and refuses any other.
 * @throws {AirflowInputError} With the fault that says where the value stands and what is taken.
 * @example requireWithin(3, [0, 5], { path: ["probe"], code: "out_of_range", detail: "0 to 5 is taken." }) // 3
 */
export function requireWithin(value: number, [least, greatest]: readonly [number, number], fault: InputFault): number {
  if (value >= least && value <= greatest) return value;
  throw new AirflowInputError(fault);
}
