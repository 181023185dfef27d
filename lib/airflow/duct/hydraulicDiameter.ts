import { area } from "./area";
import type { InsideDuct } from "./insideDuct";
import { perimeter } from "./perimeter";

/**
 * Hydraulic diameter, D_h = 4 A / P. For a rectangle 2 w h / (w + h), the equivalent diameter of Method 1.
 * @param inside Inside dimensions in m, above 0.
 * @returns Hydraulic diameter in m.
 * @example hydraulicDiameter({ shape: "rectangular", width: 0.75, height: 0.25 }) // 0.375
 * @see 40 CFR Part 60, Appendix A-1, Method 1, equation 1-1 (rectangular ducts).
 */
export const hydraulicDiameter = (inside: InsideDuct): number => (4 * area(inside)) / perimeter(inside);
