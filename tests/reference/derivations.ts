/**
 * The point rules derived from what they are meant to do, independently of the engine: it has the printed decimals, this
 * has none.
 */

/**
 * Log-Tchebycheff, rectangular: the outermost of n equal cells has its point where the logarithmic law has the cell's
 * mean, 1/e of the cell from the wall; the middle n − 2 cells have Chebyshev's equally weighted nodes.
 */
export function derivedLogTchebycheff(count: number): number[] {
  const wall = 1 / count / Math.E;
  const middle = chebyshevNodes(count - 2).map((node) => 0.5 + (node * (count - 2)) / count / 2);
  return [wall, ...middle, 1 - wall];
}

/** Nodes in −1…1 whose plain mean integrates every power up to their number: their power sums are known, hence their polynomial. */
function chebyshevNodes(count: number): number[] {
  const powerSum = (power: number): number => (power % 2 === 0 ? count / (power + 1) : 0);
  // Newton's identities, from power sums to the coefficients of x^n − e₁ x^(n−1) + e₂ x^(n−2) − …
  const elementary = [1];
  for (let k = 1; k <= count; k += 1) {
    let sum = 0;
    for (let i = 1; i <= k; i += 1) sum += (-1) ** (i - 1) * elementary[k - i]! * powerSum(i);
    elementary.push(sum / k);
  }
  return rootsBetween((x) => elementary.reduce((sum, coefficient, k) => sum + (-1) ** k * coefficient * x ** (count - k), 0), -1, 1);
}

/** Roots of a function by scanning for changes of sign and halving. The odd step keeps a root at 0 off the scan's own points. */
function rootsBetween(f: (x: number) => number, from: number, to: number, steps = 997): number[] {
  const at = (index: number): number => from + ((to - from) * index) / steps;
  const roots: number[] = [];
  for (let index = 0; index < steps; index += 1) {
    let [low, high] = [at(index), at(index + 1)];
    if (f(low) * f(high) > 0) continue;
    for (let halving = 0; halving < 60; halving += 1) {
      const middle = (low + high) / 2;
      if (f(low) * f(middle) <= 0) high = middle;
      else low = middle;
    }
    roots.push((low + high) / 2);
  }
  return roots;
}

/**
 * Log-linear, round: with an even number of points on a radius, rings of equal area with two points each; with an odd
 * number, one point in the outermost ring and two in each of the others, twice as large. Two points match the ring's
 * means of ln y and of y (y from the wall, radius 1); a single one that of ln y.
 */
export function derivedLogLinear(perDiameter: number): number[] {
  const perRadius = perDiameter / 2;
  const single = perRadius % 2;
  const fromWall: number[] = single ? [Math.exp(meanLog(Math.sqrt(1 - 1 / perRadius), 1))] : [];
  for (let outerArea = 1 - single / perRadius; outerArea > 1e-12; outerArea -= 2 / perRadius) {
    fromWall.push(...pairIn(Math.sqrt(Math.max(0, outerArea - 2 / perRadius)), Math.sqrt(outerArea)));
  }
  const half = fromWall.map((y) => y / 2).sort((one, other) => one - other);
  return [...half, ...half.map((y) => 1 - y).reverse()];
}

/** Mean of ln(1 − r) over the ring, by its antiderivative. */
function meanLog(inner: number, outer: number): number {
  const antiderivative = (r: number): number => (r === 1 ? 0 : (r ** 2 - 1) * Math.log(1 - r)) - r - r ** 2 / 2;
  return (antiderivative(outer) - antiderivative(inner)) / (outer ** 2 - inner ** 2);
}

/** Two distances with the ring's mean of y as their mean and e to twice its mean of ln y as their product. */
function pairIn(inner: number, outer: number): [number, number] {
  const mean = 1 - (2 * (outer ** 3 - inner ** 3)) / (3 * (outer ** 2 - inner ** 2));
  const spread = Math.sqrt(mean ** 2 - Math.exp(2 * meanLog(inner, outer)));
  return [mean - spread, mean + spread];
}
