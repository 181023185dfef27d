import type { Check } from "../checks/check";
import { inAnswerUnits } from "../units/convert";
import type { UnitSystem } from "../units/units";
import { FEWEST_CELLS, MOST_CELLS, WIDEST_CELL } from "./equalArea";
import { minimumCounts, type PointCounts } from "./minimumPoints";
import type { TraversePlan } from "./plan";

interface Shortfall {
  compared: Check["compared"];
  detail: string;
}

const COUNT_WORDS = {
  across: "points across the width",
  down: "points down the height",
  perDiameter: "points on a diameter",
  diameters: "diameters",
} as const satisfies Record<keyof PointCounts, string>;
const HAIR = 1e-9;

/** What a plan lacks against its rule, or null where it has enough. */
export function countShortfall(plan: TraversePlan, system: UnitSystem): Shortfall | null {
  const { inside, layout, counts, countedPoints, minimumPoints } = plan;
  const minimum = minimumCounts(inside, layout, plan.givenSite);
  if (!minimum || !counts || minimumPoints === null) return null;
  if (layout === "method_1") return fewerThan("points", countedPoints, minimumPoints);
  if (layout === "equal_area" && inside.shape === "rectangular") {
    return fewerThan("points", countedPoints, FEWEST_CELLS) ?? (countedPoints < MOST_CELLS ? tooWide(Math.max(inside.width / counts.across, inside.height / counts.down), system) : null);
  }
  const names = Object.keys(COUNT_WORDS) as (keyof PointCounts)[];
  return names.reduce<Shortfall | null>((found, name) => found ?? fewerThan(COUNT_WORDS[name], counts[name], minimum[name] ?? 0), null);
}

function fewerThan(quantity: string, value: number, limit: number): Shortfall | null {
  if (value >= limit) return null;
  return { compared: { quantity, value, limit, unit: null }, detail: `The plan has ${value} ${quantity}; its rule asks for at least ${limit}. Count on a larger uncertainty, or read more.` };
}

function tooWide(distance: number, system: UnitSystem): Shortfall | null {
  if (distance <= WIDEST_CELL + HAIR) return null;
  const { value, unit } = inAnswerUnits("length", distance, system);
  return {
    compared: { quantity: "distance between cell centres", value, limit: inAnswerUnits("length", WIDEST_CELL, system).value, unit },
    detail: "Cell centres are more than 6 in (150 mm) apart. Read more points, unless there are 64 already.",
  };
}
