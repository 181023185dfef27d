/**
 * Mean over the points of a traverse, Σ w x / Σ w; with equal weights the arithmetic mean.
 * @param values One for each point.
 * @param weights Above 0, one for each point.
 * @returns The mean, in the unit of the values.
 * @example weightedMean([1, 2, 6], [1, 1, 1]) // 3
 */
export function weightedMean(values: readonly number[], weights: readonly number[]): number {
  let sum = 0;
  let total = 0;
  for (let index = 0; index < values.length; index += 1) {
    sum += values[index]! * weights[index]!;
    total += weights[index]!;
  }
  return sum / total;
}

/**
 * Sample standard deviation, √(Σ (x − x̄)² / (n − 1)).
 * @param values At least one.
 * @returns In the unit of the values; 0 for a single value.
 * @example standardDeviation([2, 4, 6]) // 2
 */
export function standardDeviation(values: readonly number[]): number {
  if (values.length < 2) return 0;
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  const squares = values.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  return Math.sqrt(squares / (values.length - 1));
}
