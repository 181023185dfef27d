import type { InsideDuct } from "../duct/insideDuct";
import type { Chord, Face, Hole, Place } from "./line";

/** Inside width and height of a duct as it is drawn, in m. */
export function extent(inside: InsideDuct): { width: number; height: number } {
  switch (inside.shape) {
    case "rectangular":
      return { width: inside.width, height: inside.height };
    case "round":
      return { width: inside.diameter, height: inside.diameter };
    case "flat_oval":
      return { width: inside.major, height: inside.minor };
  }
}

/** A duct with what stands between its outside and its inside, in m. */
export interface WalledDuct {
  inside: InsideDuct;
  wall: number;
}

const INTO: Record<Face, Place> = { top: { x: 0, y: -1 }, bottom: { x: 0, y: 1 }, left: { x: 1, y: 0 }, right: { x: -1, y: 0 } };

/**
 * The line through a hole in a face of a rectangular or flat oval duct, square to that face.
 * @param at Fraction of the face's inside length: from the left on top and bottom, from the top on the sides.
 */
export function faceLine({ inside, wall }: WalledDuct, face: Face, at: number): Hole & Chord {
  const { width, height } = extent(inside);
  const upright = face === "top" || face === "bottom";
  const along = at * (upright ? width : height);
  const rise = inside.shape === "flat_oval" ? ovalRise(inside, upright, along) : 0;
  const recess = inside.shape === "flat_oval" ? inside.minor / 2 - half(inside.minor / 2, rise) : 0;
  const across = upright ? along : height - along;
  const start = { top: { x: across, y: height - recess }, bottom: { x: across, y: recess }, left: { x: recess, y: across }, right: { x: width - recess, y: across } }[face];
  return {
    face, edge: upright ? "left" : "top", along, alongOutside: along + wall, angle: null,
    start, direction: INTO[face], length: (upright ? height : width) - 2 * recess,
    wall: inside.shape === "flat_oval" ? half(inside.minor / 2 + wall, rise) - half(inside.minor / 2, rise) : wall,
  };
}

/** How far off the centre of a flat oval's rounded end a line passes, in m; 0 where it meets the flat. */
function ovalRise({ major, minor }: { major: number; minor: number }, upright: boolean, along: number): number {
  const radius = minor / 2;
  if (!upright) return Math.abs(along - radius);
  return Math.max(0, radius - along, along - (major - radius));
}

/** Half the chord of a circle at a distance from its centre. */
const half = (radius: number, distance: number): number => Math.sqrt(Math.max(0, radius ** 2 - distance ** 2));

/** Unit vector from a centre outwards at degrees clockwise from the top. */
export function outward(degrees: number): Place {
  const turn = (degrees * Math.PI) / 180;
  return { x: Math.sin(turn), y: Math.cos(turn) };
}

/** The line from a hole in a curved wall towards the centre of the curve. */
export function radialChord(centre: Place, radius: number, wall: number, degrees: number, length: number): Chord {
  const out = outward(degrees);
  return { start: { x: centre.x + radius * out.x, y: centre.y + radius * out.y }, direction: { x: -out.x, y: -out.y }, length, wall };
}

/** The face that an angle on a round duct lies in. */
export function faceAt(degrees: number): Face {
  const quarter = Math.round((((degrees % 360) + 360) % 360) / 90) % 4;
  return (["top", "right", "bottom", "left"] as const)[quarter]!;
}

/** Degrees clockwise from the top of the middle of a face. */
export const ANGLE_OF: Record<Face, number> = { top: 0, right: 90, bottom: 180, left: 270 };

/**
 * How far a place is from the nearest wall, in m.
 * @param place In m from the left and the bottom of the inside.
 * @example wallDistance({ shape: "round", diameter: 1 }, { x: 0.5, y: 0.25 }) // 0.25
 */
export function wallDistance(inside: InsideDuct, { x, y }: Place): number {
  const { width, height } = extent(inside);
  if (inside.shape === "rectangular") return Math.min(x, width - x, y, height - y);
  const radius = height / 2;
  const spine = Math.min(Math.max(x, radius), width - radius);
  return radius - Math.hypot(x - spine, y - radius);
}
