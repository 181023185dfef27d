import type { ResolvedAir } from "../air/resolveAir";
import type { InsideDuct } from "../duct/insideDuct";
import type { Instrument, LayoutRule, Probe, Readings, Site } from "../types";
import type { UnitSystem } from "../units/units";
import type { TraverseVelocity } from "../velocity/traverseVelocity";
import type { Check } from "./check";

/** What a check may look at. The duct and what belongs to it are missing where only an average was asked for. */
export interface CheckContext {
  readings: Readings;
  traverse: TraverseVelocity;
  air: ResolvedAir;
  system: UnitSystem;
  instrument?: Instrument;
  probe?: Probe;
  inside?: InsideDuct;
  site?: Site;
  layout?: LayoutRule;
  /** Least number of points that the layout's rule asks for; null where it has none. */
  minimumPoints?: number | null;
}

/** A check that does not apply, or for which nothing is known, gives null. */
export type CheckFunction = (context: CheckContext) => Check | null;
