/**
 * Standard uncertainty of a rectangular distribution over its half-width: u = a / √3.
 * @see GUM, ISO/IEC Guide 98-3, 4.3.7.
 */
export const RECTANGULAR = 1 / Math.sqrt(3);
