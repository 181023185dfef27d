import { AirflowInputError, type Path } from "../errors";
import { faceLine, type WalledDuct } from "./chord";
import { pointAt, type Chord, type Face, type Hole, type TraverseLine } from "./line";
import { MOST_POINTS, type CustomLine, type PlanPoints } from "./request";
import { diameterLine } from "./round";

/**
 * Lines and depths of the caller's own.
 * @throws {AirflowInputError} No lines; a place outside the duct; depths that do not ascend; weights that do not fit.
 */
export function customLines(duct: WalledDuct, points: PlanPoints | undefined, face: Face): TraverseLine[] {
  const lines = points?.lines;
  if (!lines?.length) throw refusal(["points"], "custom_lines_missing", "The layout `custom` needs `points.lines`: where each line is, and its depths.");
  const other = (["across", "down", "perDiameter", "diameters"] as const).find((name) => points?.[name] !== undefined);
  if (other) throw refusal(["points", other], "points_not_for_layout", "The layout `custom` takes lines alone; their depths are the points.");
  if (lines.reduce((sum, { depths }) => sum + depths.length, 0) > MOST_POINTS) throw refusal(["points", "lines"], "too_many_points", `A traverse has at most ${MOST_POINTS} points.`);
  const firstTurn = lines[0]?.angle ?? 0;
  return lines.map((line, index) => customLine(duct, line, face, firstTurn, ["points", "lines", index]));
}

function customLine(duct: WalledDuct, line: CustomLine, face: Face, firstTurn: number, path: Path): TraverseLine {
  requireDepths(line, path);
  const chord = duct.inside.shape === "round" ? roundLine(duct.inside.diameter, duct.wall, line, face, firstTurn, path) : straightLine(duct, line, face, path);
  return { ...chord, points: line.depths.map((depth, index) => pointAt(chord, depth * chord.length, line.weights?.[index] ?? 1)) };
}

function roundLine(diameter: number, wall: number, { at, angle = 0 }: CustomLine, face: Face, firstTurn: number, path: Path): Hole & Chord {
  if (at !== undefined) throw refusal([...path, "at"], "points_not_for_layout", "A line of a round duct is placed by its `angle`.");
  if (!(Math.abs(angle) <= 360)) throw refusal([...path, "angle"], "angle_out_of_range", "An angle is from −360 to 360 degrees.");
  return diameterLine(diameter, wall, face, angle, firstTurn);
}

function straightLine(duct: WalledDuct, { at, angle }: CustomLine, face: Face, path: Path): Hole & Chord {
  if (angle !== undefined) throw refusal([...path, "angle"], "points_not_for_layout", "Angles belong to round ducts; this line is placed by `at`.");
  if (at === undefined) throw refusal(path, "line_without_place", "The line needs `at`: its place on the face, as a fraction of the face's inside length.");
  if (!(at > 0 && at < 1)) throw refusal([...path, "at"], "place_out_of_range", "A line lies between the walls: `at` is above 0 and below 1.");
  return faceLine(duct, face, at);
}

function requireDepths({ depths, weights }: CustomLine, path: Path): void {
  if (depths.length === 0) throw refusal([...path, "depths"], "line_without_points", "A line has at least one point.");
  const outside = depths.findIndex((depth) => !(depth > 0 && depth < 1));
  if (outside >= 0) throw refusal([...path, "depths", outside], "place_out_of_range", "A point lies between the walls: a depth is above 0 and below 1.");
  const unordered = depths.findIndex((depth, index) => index > 0 && depth <= depths[index - 1]!);
  if (unordered >= 0) throw refusal([...path, "depths", unordered], "depths_not_ascending", "Depths ascend from the near wall to the far one.");
  if (!weights) return;
  if (weights.length !== depths.length) throw refusal([...path, "weights"], "weights_do_not_fit", `The line has ${depths.length} depths and ${weights.length} weights.`);
  const bad = weights.findIndex((weight) => !(weight > 0 && weight <= 1e6));
  if (bad >= 0) throw refusal([...path, "weights", bad], "weights_do_not_fit", "A weight is above 0 and at most a million.");
}

const refusal = (path: Path, code: string, detail: string): AirflowInputError => new AirflowInputError({ path, code, detail });
