import type { InsideDuct } from "./insideDuct";

/**
 * Cross-sectional area of a duct: w h, π D² / 4, or for a flat oval of major axis a and minor axis b, π b² / 4 + b (a − b).
 * @param inside Inside dimensions in m, above 0.
 * @returns Area in m².
 * @example area({ shape: "rectangular", width: 0.5, height: 0.4 }) // 0.2
 * @see Plane geometry; flat oval as two half circles joined by a rectangle.
 */
export function area(inside: InsideDuct): number {
  switch (inside.shape) {
    case "rectangular":
      return inside.width * inside.height;
    case "round":
      return (Math.PI * inside.diameter ** 2) / 4;
    case "flat_oval":
      return (Math.PI * inside.minor ** 2) / 4 + inside.minor * (inside.major - inside.minor);
  }
}

/** The equation that `area` uses for a shape, as a reader writes it. */
export const AREA_EQUATION = {
  rectangular: "A = w h",
  round: "A = π D² / 4",
  flat_oval: "A = π b² / 4 + b (a − b)",
} as const;
