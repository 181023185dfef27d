/**
 * Positions by the number of points on a diameter, as fractions of the inside diameter from one wall: in rings of equal
 * area, each with two points that match the ring's mean of ln y and of y.
 * @see ISO 3966; 6 and 8 points as in ISO 5802, 4 and 10 from memory (tests/reference/layouts.test.ts derives every decimal).
 */
export const LOG_LINEAR: Readonly<Record<number, readonly number[]>> = {
  4: [0.043, 0.29, 0.71, 0.957],
  6: [0.032, 0.135, 0.321, 0.679, 0.865, 0.968],
  8: [0.021, 0.117, 0.184, 0.345, 0.655, 0.816, 0.883, 0.979],
  10: [0.019, 0.077, 0.153, 0.217, 0.361, 0.639, 0.783, 0.847, 0.923, 0.981],
};

/** At least three points on each radius. @see ISO 3966 (from memory). */
export const LOG_LINEAR_LEAST_PER_DIAMETER = 6;
