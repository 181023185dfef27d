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
 * The place of a grid that stands off furthest from what its row and its column suggest without it: an additive model
 * fitted by least squares, of logarithms a product of two profiles, with the deleted residual of the place and the
 * standard deviation that the others give it. The scatter without a place falls as its residual grows, so the place
 * with the greatest residual is the furthest off in standard deviations too.
 * @param leastScatter Standard deviation of a single place that is taken at the least.
 * @returns The deviation and the degrees of freedom behind its standard deviation; null where the grid leaves no freedom.
 * @see Deleted (externally studentized) residuals: Cook and Weisberg, Residuals and Influence in Regression, 1982 (from memory).
 */
export function furthestDeviation(grid: Grid, leastScatter: number): { furthest: Deviation; freedom: number } | null {
  const columns = Math.max(...grid.map((row) => row.length));
  const residual = additiveResiduals(grid, columns);
  let places = 0;
  let squares = 0;
  let greatest = { row: 0, column: 0, value: 0 };
  for (let row = 0; row < residual.length; row += 1) {
    for (let column = 0; column < columns; column += 1) {
      const value = residual[row]![column];
      if (value == null) continue;
      places += 1;
      squares += value ** 2;
      if (Math.abs(value) > Math.abs(greatest.value)) greatest = { row, column, value };
    }
  }
  const freedom = places - grid.length - columns;
  if (freedom < 1 || greatest.value === 0) return null;
  // Exact for a full grid; near enough where a place or two are missing.
  const left = 1 - 1 / grid.length - 1 / columns + 1 / (grid.length * columns);
  const { row, column, value } = greatest;
  const scatter = Math.max(leastScatter, Math.sqrt(Math.max(0, squares - value ** 2 / left) / freedom));
  return { furthest: { row, column, off: value / left, expected: grid[row]![column]! - value / left, deviation: scatter / Math.sqrt(left) }, freedom };
}

/** What rows and columns leave unexplained: means are taken out in turn until nothing changes, in a full grid at once. */
function additiveResiduals(grid: Grid, columns: number): Grid {
  const residual = grid.map((row) => [...row]);
  for (let sweep = 0, moved = Infinity; sweep < MOST_SWEEPS && moved > SETTLED; sweep += 1) {
    moved = 0;
    for (let row = 0; row < residual.length; row += 1) moved = Math.max(moved, takeMeanOutOfRow(residual[row]!));
    for (let column = 0; column < columns; column += 1) moved = Math.max(moved, takeMeanOutOfColumn(residual, column));
  }
  return residual;
}

/** Takes the mean out of a row. @returns How much that moved it. */
function takeMeanOutOfRow(row: (number | null)[]): number {
  let sum = 0;
  let count = 0;
  for (let column = 0; column < row.length; column += 1) {
    const value = row[column];
    if (value == null) continue;
    sum += value;
    count += 1;
  }
  if (count === 0) return 0;
  for (let column = 0; column < row.length; column += 1) if (row[column] != null) row[column]! -= sum / count;
  return Math.abs(sum / count);
}

/** Takes the mean out of a column. @returns How much that moved it. */
function takeMeanOutOfColumn(grid: Grid, column: number): number {
  let sum = 0;
  let count = 0;
  for (let row = 0; row < grid.length; row += 1) {
    const value = grid[row]![column];
    if (value == null) continue;
    sum += value;
    count += 1;
  }
  if (count === 0) return 0;
  for (let row = 0; row < grid.length; row += 1) if (grid[row]![column] != null) grid[row]![column]! -= sum / count;
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
