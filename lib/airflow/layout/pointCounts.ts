import type { InsideDuct } from "../duct/insideDuct";
import { AirflowInputError } from "../errors";
import type { LayoutRule } from "../types";
import { LOG_LINEAR } from "./logLinear";
import { LOG_TCHEBYCHEFF } from "./logTchebycheff";
import { METHOD_1_GRIDS, METHOD_1_MOST_PER_DIAMETER } from "./method1";
import { totalOf, type PointCounts } from "./minimumPoints";
import { MOST_POINTS, type PlanPoints } from "./request";

const COUNTS = ["across", "down", "perDiameter", "diameters"] as const;
type CountName = (typeof COUNTS)[number];

const APPLICABLE: Record<InsideDuct["shape"], readonly CountName[]> = {
  rectangular: ["across", "down"],
  round: ["perDiameter", "diameters"],
  flat_oval: ["across", "down", "perDiameter"],
};

const fault = (name: string | null, code: string, detail: string): AirflowInputError => new AirflowInputError({ path: name ? ["points", name] : ["points"], code, detail });

/**
 * The counts of a plan: those asked for, with the rule's minimum for what was left out.
 * @throws {AirflowInputError} A count that does not belong to the shape, or that the rule has no positions for.
 */
export function resolveCounts(inside: InsideDuct, layout: LayoutRule, points: PlanPoints, minimum: PointCounts): Required<PointCounts> {
  if (points.lines) throw fault("lines", "points_not_for_layout", "Lines of your own belong to the layout `custom`.");
  for (const name of COUNTS) {
    const count = points[name];
    if (count === undefined) continue;
    if (!APPLICABLE[inside.shape].includes(name)) throw fault(name, "points_not_for_layout", `The count \`${name}\` does not belong to this shape. It takes ${APPLICABLE[inside.shape].join(", ")}.`);
    if (!Number.isInteger(count) || count < 1) throw fault(name, "count_not_whole", "A count is a whole number, 1 or more.");
  }
  const { across = 0, down = 0, perDiameter = 0, diameters = 0 } = { ...minimum, ...definedOf(points) };
  const counts = { across, down, perDiameter, diameters };
  requirePositions(inside, layout, counts);
  if (totalOf(counts) > MOST_POINTS) throw fault(null, "too_many_points", `A traverse has at most ${MOST_POINTS} points.`);
  return counts;
}

const definedOf = (points: PlanPoints): PointCounts => Object.fromEntries(COUNTS.flatMap((name) => (points[name] === undefined ? [] : [[name, points[name]]])));

function requirePositions(inside: InsideDuct, layout: LayoutRule, counts: Required<PointCounts>): void {
  const { shape } = inside;
  if (inside.shape === "flat_oval" && inside.major === inside.minor && counts.across > 0) {
    throw fault("across", "no_flat_middle", "Both axes of the duct are the same, so it has no flat middle to put lines in. Describe it as round, or leave `across` out.");
  }
  const published = (name: CountName, table: Readonly<Record<number, unknown>>): void => {
    if (!(counts[name] in table)) throw fault(name, "count_not_in_table", `The rule has positions for ${Object.keys(table).join(", ")} points, not for ${counts[name]}.`);
  };
  if (layout === "log_tchebycheff" && shape === "rectangular") published("across", LOG_TCHEBYCHEFF);
  if (layout === "log_tchebycheff") published("down", LOG_TCHEBYCHEFF);
  if (layout === "log_linear") published("perDiameter", LOG_LINEAR);
  else if (counts.perDiameter % 2 !== 0) throw fault("perDiameter", "count_not_even", "A diameter has an even number of points, the same on both sides of the centre.");
  if (shape === "round" && counts.diameters !== 2 && (counts.diameters !== 3 || layout === "method_1")) {
    throw fault("diameters", "diameters_not_possible", layout === "method_1" ? "Method 1 has two diameters at 90°." : "A traverse has two diameters at 90° or three at 60°.");
  }
  if (layout === "method_1") requireMethod1Table(shape, counts);
}

function requireMethod1Table(shape: InsideDuct["shape"], { across, down, perDiameter }: Required<PointCounts>): void {
  if (shape === "round" && perDiameter > METHOD_1_MOST_PER_DIAMETER) {
    throw fault("perDiameter", "count_not_in_table", `Table 1-2 of Method 1 ends at ${METHOD_1_MOST_PER_DIAMETER} points on a diameter.`);
  }
  const inTable = METHOD_1_GRIDS.some(([more, fewer]) => more === Math.max(across, down) && fewer === Math.min(across, down));
  if (shape === "rectangular" && !inTable) {
    throw fault(null, "count_not_in_table", `Table 1-1 of Method 1 has the grids ${METHOD_1_GRIDS.map(([more, fewer]) => `${more} × ${fewer}`).join(", ")}, not ${across} × ${down}.`);
  }
}
