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
