import type { InsideDuct } from "./insideDuct";

/**
 * Wetted perimeter of a duct: 2 (w + h), π D, or for a flat oval of major axis a and minor axis b, π b + 2 (a − b).
 * @param inside Inside dimensions in m, above 0.
 * @returns Perimeter in m.
 * @example perimeter({ shape: "rectangular", width: 0.5, height: 0.25 }) // 1.5
 * @see Plane geometry.
 */
export function perimeter(inside: InsideDuct): number {
  switch (inside.shape) {
    case "rectangular":
      return 2 * (inside.width + inside.height);
    case "round":
      return Math.PI * inside.diameter;
    case "flat_oval":
      return Math.PI * inside.minor + 2 * (inside.major - inside.minor);
  }
}

/** The equation that `perimeter` uses for a shape, as a reader writes it. */
export const PERIMETER_EQUATION = {
  rectangular: "P = 2 (w + h)",
  round: "P = π D",
  flat_oval: "P = π b + 2 (a − b)",
} as const;
