/** Faces of a duct as it is drawn, looking in the direction of the flow. */
export type Face = "top" | "bottom" | "left" | "right";

/**
 * From where along a face a hole is measured: an edge of the duct, hole 1 one way round, or the middle of a flat oval's
 * rounded end.
 */
export type Edge = "left" | "top" | "hole_1_clockwise" | "hole_1_anticlockwise" | "middle_of_end";

/** A place in the cross-section, in m from the left and from the bottom of the inside. */
export interface Place {
  x: number;
  y: number;
}

/** The straight way of a probe through the duct. */
export interface Chord {
  /** Where it comes through the inside face. */
  start: Place;
  /** Unit vector into the duct. */
  direction: Place;
  /** From the inside face to where it ends, in m. */
  length: number;
  /** Wall and lining that it passes before the inside, in m. */
  wall: number;
}

/** Where a hole is drilled. */
export interface Hole {
  face: Face;
  edge: Edge;
  /** Distance of the hole from the edge, in m, between inside faces or along the inside of a curve. */
  along: number;
  /** The same on the outside, where it is marked: wall added, or along the outside of a curve. */
  alongOutside: number;
  /** On a curve, degrees clockwise from the top; null on a flat face. */
  angle: number | null;
}

export interface LayoutPoint extends Place {
  /** From the inside face along the line, in m. */
  depth: number;
  /** Share of the cross-section that it stands for; all together make 1. */
  weight: number;
  /** How many points of the rule it is: more than 1 where the wall limit made them one. */
  standsFor: number;
}

/** A hole with the points read through it, in the order read. */
export interface TraverseLine extends Hole, Chord {
  points: LayoutPoint[];
}

/** A point on a line at a depth, whose weight is still to be scaled. */
export function pointAt({ start, direction }: Chord, depth: number, weight: number, standsFor = 1): LayoutPoint {
  return { x: start.x + direction.x * depth, y: start.y + direction.y * depth, depth, weight: weight * standsFor, standsFor };
}

/** The lines with weights that sum to 1. */
export function withUnitWeight(lines: TraverseLine[]): TraverseLine[] {
  const total = lines.reduce((sum, { points }) => points.reduce((part, { weight }) => part + weight, sum), 0);
  return lines.map((line) => ({ ...line, points: line.points.map((point) => ({ ...point, weight: point.weight / total })) }));
}
