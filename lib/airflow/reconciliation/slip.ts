/** The slips that reconciliation knows. */
export const SLIPS = [
  "digit_changed",
  "digits_swapped",
  "digit_dropped",
  "digit_added",
  "decimal_moved",
  "reading_left_out",
  "reading_repeated",
  "wrong_count",
  "outside_for_inside",
  "wall_subtracted_once",
  "radius_for_diameter",
  "area_conversion",
  "pressures_averaged",
  "density_ignored",
  "unit_confused",
  "rounded_early",
] as const;
export type SlipName = (typeof SLIPS)[number];

export const DIMENSIONS = ["width", "height", "diameter", "major", "minor"] as const;
export type DimensionName = (typeof DIMENSIONS)[number];

/** The figures a report can state, in the order they are worked out. */
export const FIGURES = ["total", "count", "average", ...DIMENSIONS, "area", "airflow"] as const;
export type FigureName = (typeof FIGURES)[number];

/** One suspected slip: what it touches, what stood there and what was used instead. */
export interface Slip {
  slip: SlipName;
  /** The reading it touches, counted from 1. */
  at?: { line: number; point: number };
  /** The figure it touches, where it is not a reading. */
  figure?: FigureName;
  /** What stands on the sheet, or what the figure ought to be; null where the slip is not about one number. */
  read: number | null;
  /** What the slip made of it; null for a reading left out. */
  used: number | null;
  /** Unit of `read` and `used`. */
  unit: string | null;
  /** The slip in words. */
  detail: string;
}
