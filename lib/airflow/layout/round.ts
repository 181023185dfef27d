import type { LayoutRule } from "../types";
import { ANGLE_OF, faceAt, radialChord, type WalledDuct } from "./chord";
import { annulusPositions } from "./equalArea";
import { pointAt, type Chord, type Face, type Hole, type TraverseLine } from "./line";
import { LOG_LINEAR } from "./logLinear";
import { keepOffWall, wallLimit } from "./method1";
import type { PointCounts } from "./minimumPoints";

/** Degrees from hole 1. Three holes lie on the side that is entered from, so that all can be reached from there. */
const TURNS: Readonly<Record<number, readonly number[]>> = { 2: [0, 90], 3: [0, 60, -60] };

/** The diameters of a round duct, each read from its hole to the far wall. */
export function roundLines(duct: WalledDuct, diameter: number, layout: LayoutRule, { perDiameter, diameters }: Required<PointCounts>, face: Face, probeDiameter: number): TraverseLine[] {
  const positions = layout === "log_linear" ? LOG_LINEAR[perDiameter]! : annulusPositions(perDiameter);
  const depths = positions.map((position) => position * diameter);
  const kept = layout === "method_1" ? keepOffWall(depths, diameter, wallLimit(duct.inside, probeDiameter)) : depths.map((depth) => ({ depth, standsFor: 1 }));
  return TURNS[diameters]!.map((turn) => {
    const line = diameterLine(diameter, duct.wall, face, turn);
    return { ...line, points: kept.map(({ depth, standsFor }) => pointAt(line, depth, 1, standsFor)) };
  });
}

/**
 * The diameter that starts a number of degrees clockwise from the middle of a face. Its hole is measured round the duct,
 * with a tape, from hole 1.
 * @param firstTurn Degrees clockwise from the middle of the face to hole 1.
 */
export function diameterLine(diameter: number, wall: number, face: Face, turn: number, firstTurn = 0): Hole & Chord {
  const radius = diameter / 2;
  const angle = (ANGLE_OF[face] + turn + 360) % 360;
  const fromFirst = ((turn - firstTurn + 900) % 360) - 180;
  const radians = (Math.abs(fromFirst) * Math.PI) / 180;
  return {
    face: faceAt(angle), edge: fromFirst < 0 ? "hole_1_anticlockwise" : "hole_1_clockwise", along: radius * radians, alongOutside: (radius + wall) * radians, angle,
    ...radialChord({ x: radius, y: radius }, radius, wall, angle, diameter),
  };
}
