/** A grid of logarithms: one row for each line of points, null where there is none. */
export type Grid = (number | null)[][];

/** How one place of a grid stands to the others. */
export interface Deviation {
  row: number;
  column: number;
  /** What the other places suggest for it. */
  expected: number;
  /** How far it is from that, above 0 when it is above. */
  off: number;
  /** Standard deviation of `off`, from the scatter of the others. */
  deviation: number;
}

const MOST_SWEEPS = 30;
const SETTLED = 1e-9;

/**
 * Each place of a grid against what its row and its column suggest without it: an additive model fitted by least squares, of
 * logarithms a product of two profiles, with the deleted residual of each place and the standard deviation that the others give it.
 * @param leastScatter Standard deviation of a single place that is taken at the least.
 * @returns The deviations and the degrees of freedom behind their standard deviation; none where the grid leaves no freedom.
 * @see Deleted (externally studentized) residuals: Cook and Weisberg, Residuals and Influence in Regression, 1982 (from memory).
 */
export function deviations(grid: Grid, leastScatter: number): { deviations: Deviation[]; freedom: number } {
  const residual = additiveResiduals(grid);
  const columns = Math.max(...grid.map((row) => row.length));
  const places = residual.flatMap((row, index) => row.flatMap((value, column) => (value === null ? [] : [{ row: index, column, value }])));
  const freedom = places.length - grid.length - columns;
  if (freedom < 1) return { deviations: [], freedom: 0 };
  // Exact for a full grid; near enough where a place or two are missing.
  const left = 1 - 1 / grid.length - 1 / columns + 1 / (grid.length * columns);
  const squares = places.reduce((sum, { value }) => sum + value ** 2, 0);
  const found = places.map(({ row, column, value }) => {
    const scatter = Math.max(leastScatter, Math.sqrt(Math.max(0, squares - value ** 2 / left) / freedom));
    return { row, column, off: value / left, expected: grid[row]![column]! - value / left, deviation: scatter / Math.sqrt(left) };
  });
  return { deviations: found, freedom };
}

/** What rows and columns leave unexplained: means are taken out in turn until nothing changes, in a full grid at once. */
function additiveResiduals(grid: Grid): Grid {
  const residual = grid.map((row) => [...row]);
  const columns = Math.max(...grid.map((row) => row.length));
  for (let sweep = 0, moved = Infinity; sweep < MOST_SWEEPS && moved > SETTLED; sweep += 1) {
    moved = 0;
    for (const row of residual) moved = Math.max(moved, takeMeanOut(columns, (column) => [row, column]));
    for (let column = 0; column < columns; column += 1) moved = Math.max(moved, takeMeanOut(residual.length, (row) => [residual[row]!, column]));
  }
  return residual;
}

/** Takes the mean out of a row or a column. @returns How much that moved it. */
function takeMeanOut(length: number, place: (index: number) => [row: (number | null)[], column: number]): number {
  let sum = 0;
  let count = 0;
  for (let index = 0; index < length; index += 1) {
    const [row, column] = place(index);
    const value = row[column];
    if (value == null) continue;
    sum += value;
    count += 1;
  }
  if (count === 0) return 0;
  for (let index = 0; index < length; index += 1) {
    const [row, column] = place(index);
    if (row[column] != null) row[column]! -= sum / count;
  }
  return Math.abs(sum / count);
}

/**
 * Quantile of Student's t distribution from that of the normal one.
 * @param normal Quantile of the normal distribution, up to 4. @param freedom Degrees of freedom, 4 or more.
 * @see Abramowitz and Stegun, 26.7.5, first three terms (from memory).
 */
export function studentQuantile(normal: number, freedom: number): number {
  const first = (normal ** 3 + normal) / 4;
  const second = (5 * normal ** 5 + 16 * normal ** 3 + 3 * normal) / 96;
  const third = (3 * normal ** 7 + 19 * normal ** 5 + 17 * normal ** 3 - 15 * normal) / 384;
  return normal + first / freedom + second / freedom ** 2 + third / freedom ** 3;
}
