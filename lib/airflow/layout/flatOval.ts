import { area } from "../duct/area";
import type { LayoutRule } from "../types";
import { faceLine, radialChord, type WalledDuct } from "./chord";
import { annulusPositions, cellCentres } from "./equalArea";
import { pointAt, type Face, type TraverseLine } from "./line";
import { LOG_TCHEBYCHEFF } from "./logTchebycheff";
import type { PointCounts } from "./minimumPoints";

/**
 * A flat oval duct as its rectangular middle and the two halves of a round duct at its ends. The middle has upright lines
 * in strips of equal width, points down each by the rule for a rectangle; each end has two radii at 45° to the major axis,
 * points at the middle of equal annuli. Every part's points share its area. Common practice, no source.
 */
export function flatOvalLines(duct: WalledDuct, { major, minor }: { major: number; minor: number }, layout: LayoutRule, counts: Required<PointCounts>, face: Face): TraverseLine[] {
  const middle = middleLines(duct, { major, minor }, layout, counts, face);
  return [...middle, ...endLines(duct, { major, minor }, counts.perDiameter)];
}

function middleLines(duct: WalledDuct, { major, minor }: { major: number; minor: number }, layout: LayoutRule, { across, down }: Required<PointCounts>, face: Face): TraverseLine[] {
  const positions = layout === "log_tchebycheff" ? LOG_TCHEBYCHEFF[down]! : cellCentres(down);
  const weight = (minor * (major - minor)) / (across * down);
  return cellCentres(across).map((centre) => {
    const line = faceLine(duct, face, (minor / 2 + centre * (major - minor)) / major);
    return { ...line, points: positions.map((position) => pointAt(line, position * line.length, weight)) };
  });
}

/** Degrees clockwise from the top of the holes in the right end and the left, the upper one first. */
const END_ANGLES = { right: [45, 135], left: [315, 225] } as const;

function endLines({ wall }: WalledDuct, { major, minor }: { major: number; minor: number }, perDiameter: number): TraverseLine[] {
  const radius = minor / 2;
  const positions = annulusPositions(perDiameter).slice(0, perDiameter / 2);
  const weight = area({ shape: "round", diameter: minor }) / (4 * positions.length);
  return (["left", "right"] as const).flatMap((face) =>
    END_ANGLES[face].map((angle) => {
      const chord = radialChord({ x: face === "left" ? radius : major - radius, y: radius }, radius, wall, angle, radius);
      const arc = Math.PI / 4;
      return { face, edge: "middle_of_end" as const, along: radius * arc, alongOutside: (radius + wall) * arc, angle, ...chord, points: positions.map((position) => pointAt(chord, position * minor, weight)) };
    }),
  );
}
