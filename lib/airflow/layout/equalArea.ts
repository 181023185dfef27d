const INCH = 0.0254;
/** Dimensions measured in inches come out of metres with the last digits astray; a hair must not add a cell. */
const HAIR = 1e-9;

/** Neighbouring cell centres are no farther apart, in m. Common practice, no source. */
export const WIDEST_CELL = 6 * INCH;
/** Fewest and most cells of a rectangle. Common practice, no source. */
export const FEWEST_CELLS = 16;
export const MOST_CELLS = 64;
/** A smaller round duct has six points on a diameter, in m. */
const SMALL_DIAMETER = 10 * INCH;

/**
 * Centres of equal cells along a side.
 * @param count Number of cells, 1 or more.
 * @returns Fractions of the side from one end.
 * @example cellCentres(4) // [0.125, 0.375, 0.625, 0.875]
 */
export const cellCentres = (count: number): number[] => Array.from({ length: count }, (_, index) => (index + 0.5) / count);

/**
 * Cells that the equal-area rule asks for in a rectangle: none wider than 6 in, at least 16 and at most 64 in all.
 * Above the most, cells grow where they are narrowest, so that they stay nearly square.
 * @param width Inside width in m, above 0; `height` likewise.
 * @returns Cells across the width and down the height.
 * @example equalAreaCells(0.5, 0.4) // { across: 4, down: 4 }
 * @see Common practice, no source.
 */
export function equalAreaCells(width: number, height: number): { across: number; down: number } {
  let across = cellsOn(width);
  let down = cellsOn(height);
  while (across * down < FEWEST_CELLS) {
    if (width / across >= height / down) across += 1;
    else down += 1;
  }
  while (across * down > MOST_CELLS) {
    const narrowerAcross = width / across < height / down;
    if (down === 1 || (narrowerAcross && across > 1)) across -= 1;
    else down -= 1;
  }
  return { across, down };
}

/** Cells no wider than 6 in on a side of this length in m. */
export const cellsOn = (side: number): number => Math.max(1, Math.ceil(side / WIDEST_CELL - HAIR));

/**
 * Points on a diameter at the middle of equal annuli: those circles that halve each annulus' area, r / R = √((2k − 1) / n).
 * @param perDiameter Number of points on the diameter, even, 2 or more.
 * @returns Fractions of the diameter from one wall.
 * @example annulusPositions(4).map((position) => Math.round(position * 1000)) // [67, 250, 750, 933]
 * @see 40 CFR Part 60, Appendix A-1, Method 1, Table 1-2, which is this closed form rounded to 0.1 %.
 */
export function annulusPositions(perDiameter: number): number[] {
  const radii = Array.from({ length: perDiameter / 2 }, (_, index) => Math.sqrt((2 * index + 1) / perDiameter));
  return [...radii.map((radius) => (1 - radius) / 2).reverse(), ...radii.map((radius) => (1 + radius) / 2)];
}

/**
 * Points on a diameter that the equal-area rule asks for in a round duct: 10, or 6 under 10 in.
 * @param diameter Inside diameter in m, above 0.
 * @example equalAreaPerDiameter(0.2) // 6
 * @see Common practice, no source.
 */
export const equalAreaPerDiameter = (diameter: number): 6 | 10 => (diameter < SMALL_DIAMETER - HAIR ? 6 : 10);
