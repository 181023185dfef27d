import { hydraulicDiameter } from "../duct/hydraulicDiameter";
import type { InsideDuct } from "../duct/insideDuct";
import type { Site } from "../types";
import { toSi } from "../units/convert";

/**
 * 40 CFR Part 60, Appendix A-1, Method 1, for a velocity traverse. The limits of the site, the least diameter and the
 * principle were read in the rule's text; the counts, the table and the wall limits are from memory.
 */

/** Table 1-1: the grids a rectangular duct may have, the longer row first. */
export const METHOD_1_GRIDS: readonly (readonly [number, number])[] = [[3, 3], [4, 3], [4, 4], [5, 4], [5, 5], [6, 5], [6, 6], [7, 6], [7, 7]];
/** Table 1-2 goes as far as this on a diameter. */
export const METHOD_1_MOST_PER_DIAMETER = 24;
/** Straight lengths, in equivalent diameters, behind and before the plane with which the fewest points do. */
export const METHOD_1_DOWNSTREAM_DIAMETERS = 8;
export const METHOD_1_UPSTREAM_DIAMETERS = 2;
/** Nearer to a disturbance than this the method does not allow a traverse at all. */
export const METHOD_1_LEAST_DOWNSTREAM_DIAMETERS = 2;
export const METHOD_1_LEAST_UPSTREAM_DIAMETERS = 0.5;
/** The method is not for a smaller duct, in m ("about 0.30 m (12 in)"). */
export const METHOD_1_LEAST_DIAMETER = 0.3;
/** "0.61 m (24 in)": the counts and the wall limits change here. */
const LARGE_DIAMETER = 0.61;
const INCH = 0.0254;
const HAIR = 1e-9;

/**
 * The fewest points of a velocity traverse. With 8 and 2 diameters of straight duct: 12, or in a duct up to 24 in 8
 * (round) or 9 (rectangular). Otherwise, and where the lengths are not known, 16; Figure 1-2 lowers this to 12 somewhat
 * before 8 diameters, but where exactly could not be read, so the larger count stands until then.
 * @param inside Inside dimensions in m.
 * @example method1Minimum({ shape: "round", diameter: 0.5 }) // 16
 * @see Method 1, 11.2.2 and Figure 1-2 (from memory).
 */
export function method1Minimum(inside: InsideDuct, site?: Site): 8 | 9 | 12 | 16 {
  const diameter = hydraulicDiameter(inside);
  const straight = (length: Site["downstream"], needed: number): boolean => length !== undefined && toSi("length", length) >= needed * diameter * (1 - HAIR);
  if (!straight(site?.downstream, METHOD_1_DOWNSTREAM_DIAMETERS) || !straight(site?.upstream, METHOD_1_UPSTREAM_DIAMETERS)) return 16;
  if (diameter > LARGE_DIAMETER) return 12;
  return inside.shape === "round" ? 8 : 9;
}

/**
 * The grid of Table 1-1 for a number of points, the longer row on the longer side.
 * @param count A number in the table: 9, 12, 16 … 49.
 * @example method1Grid(12, 0.5, 0.9) // { across: 3, down: 4 }
 */
export function method1Grid(count: number, width: number, height: number): { across: number; down: number } {
  const [more, fewer] = METHOD_1_GRIDS.find(([one, other]) => one * other === count)!;
  return width >= height ? { across: more, down: fewer } : { across: fewer, down: more };
}

/**
 * How near the wall a point may be: 1 in in a duct over 24 in, else 0.5 in, and never nearer than the probe is thick.
 * @param inside Inside dimensions in m.
 * @param probeDiameter In m, 0 where it is not known.
 * @returns Distance in m.
 * @example wallLimit({ shape: "round", diameter: 1 }) // 0.0254
 * @see Method 1, 11.3 (from memory).
 */
export const wallLimit = (inside: InsideDuct, probeDiameter = 0): number => Math.max(hydraulicDiameter(inside) > LARGE_DIAMETER ? INCH : INCH / 2, probeDiameter);

/** A depth along a line, and how many points of the rule it stands for. */
export interface Depth {
  depth: number;
  standsFor: number;
}

/**
 * Moves points that are nearer the wall than the limit to the limit; points that meet there become one that counts for all.
 * @param depths Depths from the inside face in m, ascending.
 * @param length From inside face to inside face in m.
 * @param limit Distance from either face in m.
 * @example keepOffWall([0.01, 0.02, 0.5], 1, 0.025) // [{ depth: 0.025, standsFor: 2 }, { depth: 0.5, standsFor: 1 }]
 * @see Method 1, 11.3 (from memory).
 */
export function keepOffWall(depths: readonly number[], length: number, limit: number): Depth[] {
  const kept: Depth[] = [];
  for (const depth of depths) {
    const moved = length > 2 * limit ? Math.min(Math.max(depth, limit), length - limit) : depth;
    const last = kept.at(-1);
    if (last && last.depth === moved) last.standsFor += 1;
    else kept.push({ depth: moved, standsFor: 1 });
  }
  return kept;
}
