/**
 * The cividis colour map at every fifteenth of its 256 entries; between them colours are interpolated.
 * @see Nuñez, Anderton and Renslow, "Optimizing colormaps with consideration for color vision deficiency to enable
 * accurate interpretation of scientific data", PLoS ONE 13(7), 2018; the entries are those that matplotlib 3.6.3 publishes.
 */
const ANCHORS: readonly (readonly [number, number, number])[] = [
  [0, 34, 78], [0, 45, 104], [22, 55, 112], [46, 65, 109], [63, 76, 108], [78, 86, 108],
  [92, 97, 110], [105, 107, 113], [118, 118, 118], [131, 129, 121], [146, 140, 120], [160, 152, 117],
  [175, 164, 113], [191, 176, 107], [207, 189, 98], [223, 202, 87], [240, 216, 70], [254, 232, 56],
];

/**
 * Colour of a velocity, dark blue for the slowest to yellow for the fastest.
 * @param share From 0 to 1; values outside are taken as the nearer end.
 * @returns A colour as `#rrggbb`.
 * @example cividis(0) // "#00224e"
 */
export function cividis(share: number): string {
  const at = Math.min(Math.max(share, 0), 1) * (ANCHORS.length - 1);
  const low = ANCHORS[Math.floor(at)]!;
  const high = ANCHORS[Math.ceil(at)]!;
  const channels = low.map((value, channel) => Math.round(value + (high[channel]! - value) * (at - Math.floor(at))));
  return `#${channels.map((value) => value.toString(16).padStart(2, "0")).join("")}`;
}
