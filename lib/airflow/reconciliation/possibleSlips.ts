import type { ReadingLines } from "../types";
import { forEachDigitVariant, placesOf, type DigitSlip } from "./digitVariants";
import { furthestDeviation, studentQuantile, type Deviation, type Grid } from "./profileFit";

/** A reading off the local profile that one slip in its digits would bring back. */
export interface PossibleSlip {
  line: number;
  point: number;
  /** As written. */
  read: number;
  /** What its row and column suggest, in the unit of the readings. */
  expected: number;
  /** The slips that would bring it back, the nearest to the profile first. */
  slips: { slip: DigitSlip; value: number }[];
}

/** Two-sided 0.04 %, as a quantile of the normal distribution: of 25 honest readings one in a hundred traverses has one beyond it. */
const SUSPECT_BEYOND = 3.54;
/** The scatter of readings about the profile is never taken to be less than this, relative, in velocity: no probe held by hand is steadier. */
const LEAST_SCATTER = 0.02;
/** A slip explains a reading if it leads to within this many standard deviations of what is expected. */
const BACK_WITHIN = 2;
/** Fewer rows or columns leave no majority to tell which of two readings is off. */
const LEAST_SIDE = 3;
/** Where more readings than this are off, it is the profile that is uneven. */
const MOST_SLIPS = 3;

/**
 * Readings that look like slips of the pen. Each is compared with what its line and its place on the line suggest; suspected is what
 * lies far off and would lie well if one digit were other, two were swapped, one were dropped or added, or the decimal
 * point moved. Two lines are folded at their middle, as on two diameters of a round duct; below three by three, and
 * where lines differ in length, nothing is told.
 * @param lines As written; null where nothing was read.
 * @param kind A velocity pressure scatters twice as much, relatively, as its velocity.
 * @returns At most three, the furthest off first; none where more are off.
 */
export function possibleSlips(lines: ReadingLines, kind: "velocity" | "velocity_pressure"): PossibleSlip[] {
  const logarithms = lines.map((line) => line.map((reading) => (reading !== null && reading > 0 ? Math.log(reading) : null)));
  const isFolded = lines.length === 2;
  const grid = isFolded ? foldedAtMiddle(logarithms) : logarithms;
  const columns = grid[0]!.length;
  if (grid.length < LEAST_SIDE || columns < LEAST_SIDE || grid.some((row) => row.length !== columns)) return [];
  const places = placesOf(lines);
  const leastScatter = kind === "velocity" ? LEAST_SCATTER : 2 * LEAST_SCATTER;
  const suspects: PossibleSlip[] = [];
  // One at a time, and each is taken out before the next is looked for: a bad reading hides another.
  for (let off = furthestOff(grid, leastScatter); off !== null; off = furthestOff(grid, leastScatter)) {
    if (suspects.length === MOST_SLIPS) return [];
    const [line, point] = isFolded ? unfolded(lines, off.row, off.column) : [off.row, off.column];
    const read = lines[line]![point]!;
    const slips = slipsBack(read, places, off);
    if (slips.length > 0) suspects.push({ line: line + 1, point: point + 1, read, expected: Math.exp(off.expected), slips });
    grid[off.row]![off.column] = null;
  }
  return suspects;
}

/** The place that is furthest from what the others suggest, where that is further than chance would put it. */
function furthestOff(grid: Grid, leastScatter: number): Deviation | null {
  const found = furthestDeviation(grid, leastScatter);
  if (!found) return null;
  const { furthest, freedom } = found;
  return Math.abs(furthest.off) / furthest.deviation > studentQuantile(SUSPECT_BEYOND, freedom) ? furthest : null;
}

/** Each line as two rows, both from the wall to the middle; the middle point of an odd number is in the first only. */
const foldedAtMiddle = (lines: Grid): Grid =>
  lines.flatMap((line) => {
    const half = Math.ceil(line.length / 2);
    return [line.slice(0, half), [...line].reverse().slice(0, half).map((value, index) => (2 * index + 1 === line.length ? null : value))];
  });

function unfolded(lines: ReadingLines, row: number, column: number): [line: number, point: number] {
  const line = Math.floor(row / 2);
  return [line, row % 2 === 0 ? column : lines[line]!.length - 1 - column];
}

function slipsBack(read: number, places: number, { expected, deviation }: Deviation): PossibleSlip["slips"] {
  const back: { slip: DigitSlip; value: number; off: number }[] = [];
  forEachDigitVariant(read, places, (slip, value) => {
    const off = Math.abs(Math.log(value) - expected);
    if (off <= BACK_WITHIN * deviation) back.push({ slip, value, off });
  });
  return back.sort((first, second) => first.off - second.off).map(({ slip, value }) => ({ slip, value }));
}
