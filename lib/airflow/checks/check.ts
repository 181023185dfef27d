export type CheckCode =
  | "points_below_minimum"
  | "uniformity"
  | "negative_reading"
  | "low_velocity"
  | "site_disturbance"
  | "profile_asymmetry"
  | "possible_slip"
  | "density_assumed"
  | "probe_blockage"
  | "compressibility"
  | "near_wall"
  | "duct_below_minimum"
  | "probe_length";

/** How much a failed check weighs: `information` to know, `caution` to look at, `failure` not acceptable as it stands. */
export type Severity = "information" | "caution" | "failure";

/** One check of a plan or a result, with what was compared, so that a reader can repeat it. */
export interface Check {
  code: CheckCode;
  passed: boolean;
  severity: Severity;
  /** What was found and, when it failed, what to do about it. */
  detail: string;
  compared: { quantity: string; value: number | null; limit: number | null; unit: string | null };
  /** Standard or practice the limit comes from, and how surely: "from memory", "common practice, no source". */
  source: string;
  /** The readings concerned, counted from 1, where the check is about single readings. */
  at?: { line: number; point: number }[];
}
