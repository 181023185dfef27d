export type Verdict = "within" | "outside" | "undecided";

/**
 * Whether a measured airflow meets its design, with a guard band of the expanded uncertainty: `within` when
 * |Q − Q_d| + U ≤ T, `outside` when |Q − Q_d| − U > T, otherwise `undecided`: the measurement cannot tell.
 * @param airflow Q, in any unit.
 * @param design Q_d, in the same unit.
 * @param expanded U, in the same unit.
 * @param tolerance T, in the same unit.
 * @returns The verdict.
 * @example verdict(98, 100, 3, 10) // "within"
 * @see JCGM 106:2012, guarded acceptance and guarded rejection with w = U.
 */
export function verdict(airflow: number, design: number, expanded: number, tolerance: number): Verdict {
  const difference = Math.abs(airflow - design);
  if (difference + expanded <= tolerance) return "within";
  return difference - expanded > tolerance ? "outside" : "undecided";
}
