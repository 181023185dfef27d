/**
 * Positions by the number of points on a side, as fractions of the inside dimension from one wall: the outermost of n equal
 * cells by the logarithmic law at the wall, the rest by Chebyshev's equally weighted quadrature.
 * @see ISO 3966; ASHRAE 111 (from memory; tests/reference/layouts.test.ts derives every decimal from the rule).
 */
export const LOG_TCHEBYCHEFF: Readonly<Record<number, readonly number[]>> = {
  5: [0.074, 0.288, 0.5, 0.712, 0.926],
  6: [0.061, 0.235, 0.437, 0.563, 0.765, 0.939],
  7: [0.053, 0.203, 0.366, 0.5, 0.634, 0.797, 0.947],
};

const INCH = 0.0254;
/** Sides that were measured in inches come out of metres with the last digits astray; a hair must not add a point. */
const HAIR = 1e-9;

/**
 * Points that the log-Tchebycheff rule asks for on a side: 5 under 30 in, 6 from 30 to 36 in, 7 over 36 in.
 * @param side Inside dimension in m, above 0.
 * @returns 5, 6 or 7.
 * @example logTchebycheffCount(0.8) // 6
 * @see ASHRAE 111 (from memory).
 */
export function logTchebycheffCount(side: number): 5 | 6 | 7 {
  if (side < 30 * INCH - HAIR) return 5;
  return side <= 36 * INCH + HAIR ? 6 : 7;
}
