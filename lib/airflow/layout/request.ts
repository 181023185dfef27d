import type { LayoutRule, Site } from "../types";
import type { Face } from "./line";

/** A line of a custom layout. */
export interface CustomLine {
  /** Rectangular and flat oval: where on the face, as a fraction of its inside length, from the left or the top. */
  at?: number;
  /** Round: degrees clockwise from the face entered. */
  angle?: number;
  /** Fractions of the way from the inside face through to the opposite one, ascending. */
  depths: number[];
  /** A weight for each depth; equal weights when left out. */
  weights?: number[];
}

/** How many points a traverse has; what is left out is the rule's minimum. */
export interface PlanPoints {
  /** Rectangular: points along the width. Flat oval: lines through the flat middle. */
  across?: number;
  /** Rectangular and flat oval: points down the height. */
  down?: number;
  /** Round: points on each diameter. Flat oval: the same for its two rounded ends together. */
  perDiameter?: number;
  /** Round: 2 at 90° or 3 at 60°. */
  diameters?: number;
  /** Custom layouts: the lines themselves. */
  lines?: CustomLine[];
}

/** What decides where the points of a duct lie. */
export interface LayoutRequest {
  layout: LayoutRule;
  points?: PlanPoints;
  /** Face that the holes are drilled in; the top when left out. */
  enterFrom?: Face;
  site?: Site;
  /** In m; 0 where it is not known. */
  probeDiameter?: number;
}

/** Points a traverse may have at most. */
export const MOST_POINTS = 1000;
