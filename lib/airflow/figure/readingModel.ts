import type { PointAnswer } from "../calculations/velocityAnswer";
import type { Check } from "../checks/check";
import { insideDuct, wallThickness } from "../duct/insideDuct";
import type { Face, TraverseLine } from "../layout/line";
import { placeReadings, type PlacedReadings } from "../layout/placeReadings";
import type { Duct, LayoutRule, ReadingLines, Readings } from "../types";

/** What a figure of readings is drawn from: a duct and its readings, and whatever else is known. */
export interface ReadingFigureInput {
  duct: Duct;
  readings: { lines: ReadingLines; kind?: Readings["kind"]; unit?: Readings["unit"] };
  layout?: LayoutRule;
  enterFrom?: Face;
  /** Answer of the `airflow` or `average-velocity` calculation, for the velocities and the suspected slips. */
  result?: { points?: readonly PointAnswer[]; checks?: readonly Check[] };
}

/** A reading where it was taken. */
export interface DrawnReading {
  line: number;
  point: number;
  /** In m from the left and the bottom of the inside. */
  x: number;
  y: number;
  /** As written, null where it could not be read. */
  reading: number | null;
  /** What the colour stands for; null leaves the point open. */
  coloured: number | null;
  /** A check suspects a slip. */
  suspected: boolean;
}

/** Everything that a figure of readings shows, in the cross-section. */
export interface ReadingModel {
  inside: ReturnType<typeof insideDuct>;
  wall: number;
  lines: readonly TraverseLine[];
  /** Whether the places are those of a rule, or spread evenly for want of one. */
  byRule: boolean;
  readings: DrawnReading[];
  /** Lowest and highest of what the colour stands for, suspected slips left out; null where there is nothing to colour. */
  range: { low: number; high: number } | null;
  /** What the colour stands for, with its unit. */
  colour: { quantity: "velocity" | "velocity pressure" | "reading"; unit: string | null };
}

/**
 * The readings of a traverse as points in the cross-section, coloured by velocity where the velocities are known, else by
 * the reading itself.
 * @throws {AirflowInputError} A duct that cannot be.
 */
export function readingModel({ duct, readings, layout, enterFrom, result }: ReadingFigureInput): ReadingModel {
  const inside = insideDuct(duct);
  const wall = wallThickness(duct);
  const placed: PlacedReadings = placeReadings({ inside, wall }, readings.lines.map((line) => line.length), layout, enterFrom);
  const key = (line: number, point: number): string => `${line}/${point}`;
  const velocities = result?.points && new Map(result.points.map(({ line, point, velocity }) => [key(line, point), velocity.value]));
  const slips = result?.checks?.filter(({ code, passed }) => code === "possible_slip" && !passed).flatMap(({ at }) => at ?? []) ?? [];
  const suspected = new Set(slips.map(({ line, point }) => key(line, point)));
  const drawn = placed.lines.flatMap(({ points }, l) =>
    points.map(({ x, y }, p): DrawnReading => {
      const [line, point] = [l + 1, p + 1];
      const reading = readings.lines[l]![p] ?? null;
      return { line, point, x, y, reading, coloured: velocities ? (velocities.get(key(line, point)) ?? null) : reading, suspected: suspected.has(key(line, point)) };
    }),
  );
  const colour = velocities
    ? { quantity: "velocity" as const, unit: result!.points![0]?.velocity.unit ?? null }
    : { quantity: readings.kind === "velocity" ? ("velocity" as const) : readings.kind ? ("velocity pressure" as const) : ("reading" as const), unit: readings.unit ?? null };
  return { inside, wall, lines: placed.lines, byRule: placed.byRule, readings: drawn, range: rangeOf(drawn), colour };
}

function rangeOf(readings: readonly DrawnReading[]): ReadingModel["range"] {
  // One slip of the pen would otherwise paint all the others the same dark blue.
  const trusted = readings.filter(({ suspected, coloured }) => !suspected && coloured !== null);
  const values = (trusted.length > 0 ? trusted : readings).flatMap(({ coloured }) => (coloured === null ? [] : [coloured]));
  if (values.length === 0) return null;
  return { low: values.reduce((least, value) => Math.min(least, value), Infinity), high: values.reduce((greatest, value) => Math.max(greatest, value), -Infinity) };
}

/** Place of a value between the lowest and the highest, 0 to 1; in the middle where all are the same. */
export const shareOf = (value: number, { low, high }: { low: number; high: number }): number => (high > low ? Math.min(1, Math.max(0, (value - low) / (high - low))) : 0.5);
