/** One step of the arithmetic, complete enough to be redone by hand. */
export interface WorkingStep {
  /** What the step finds, in words: "Hydraulic diameter". */
  step: string;
  /** The equation in the field's symbols: "D_h = 4 A / P". */
  equation: string;
  /** What went in: numbers with their units, by symbol. */
  inputs: Record<string, { value: number; unit: string }>;
  value: { value: number; unit: string };
  /** Standard, handbook or definition the equation comes from. */
  source: string;
}

/**
 * Collects the steps of a calculation. Calculations take it as an optional argument and record only when it is there,
 * so that an answer without working costs nothing.
 */
export class Working {
  readonly steps: WorkingStep[] = [];

  add(step: WorkingStep): void {
    this.steps.push(step);
  }
}
