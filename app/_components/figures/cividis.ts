/**
 * The cividis colour map at nine even steps; between them colours are interpolated.
 *
 * @see Nuñez, Anderton and Renslow, "Optimizing colormaps with consideration for color vision deficiency", PLoS ONE 13(7), 2018;
 * the steps are those of d3-scale-chromatic 3.1.0's `interpolateCividis` at 0, 1/8 … 1.
 */
const STEPS = [
  [0, 32, 81],
  [17, 54, 108],
  [60, 77, 110],
  [98, 100, 111],
  [127, 124, 117],
  [154, 148, 120],
  [187, 175, 113],
  [226, 203, 92],
  [253, 234, 69],
] as const;

/**
 * @param share - 0 (slowest) to 1 (fastest); values outside are taken as the nearer end.
 * @returns A CSS colour.
 */
export function cividis(share: number): string {
  const at = Math.min(Math.max(share, 0), 1) * (STEPS.length - 1);
  const low = STEPS[Math.floor(at)] ?? STEPS[0];
  const high = STEPS[Math.ceil(at)] ?? low;
  const between = at - Math.floor(at);
  return `rgb(${low.map((value, channel) => Math.round(value + ((high[channel] ?? value) - value) * between)).join(" ")})`;
}

/** The whole map, for a legend. */
export const CIVIDIS_STEPS: readonly string[] = STEPS.map((_, index) => cividis(index / (STEPS.length - 1)));
