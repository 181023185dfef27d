import type { InsideDuct } from "../duct/insideDuct";
import { AirflowInputError } from "../errors";
import type { WalledDuct } from "./chord";
import { customLines } from "./custom";
import { flatOvalLines } from "./flatOval";
import { withUnitWeight, type TraverseLine } from "./line";
import { minimumCounts, type PointCounts } from "./minimumPoints";
import { resolveCounts } from "./pointCounts";
import { rectangularLines } from "./rectangular";
import type { LayoutRequest } from "./request";
import { roundLines } from "./round";

/**
 * The holes of a traverse and the points read through each, by the rule asked for.
 * @param duct Inside dimensions and wall in m.
 * @returns Lines with points in m, in the order to read them; weights sum to 1.
 * @throws {AirflowInputError} The rule, the counts or the face entered do not fit the duct.
 * @see The rule's own file in this folder.
 */
export function layoutLines(duct: WalledDuct, { layout, points, enterFrom = "top", site, probeDiameter = 0 }: LayoutRequest): TraverseLine[] {
  const { inside } = duct;
  const counts = planCounts(inside, { layout, points, site });
  if (!counts) return withUnitWeight(customLines(duct, points, enterFrom));
  switch (inside.shape) {
    case "rectangular":
      return withUnitWeight(rectangularLines(duct, layout, counts, enterFrom, probeDiameter));
    case "round":
      return withUnitWeight(roundLines(duct, inside.diameter, layout, counts, enterFrom, probeDiameter));
    case "flat_oval":
      requireFlatFace(enterFrom);
      return withUnitWeight(flatOvalLines(duct, inside, layout, counts, enterFrom));
  }
}

/** How many points a request comes to on each side or diameter; null for a custom layout. */
export function planCounts(inside: InsideDuct, { layout, points = {}, site }: LayoutRequest): Required<PointCounts> | null {
  const minimum = minimumCounts(inside, layout, site);
  return minimum && resolveCounts(inside, layout, points, minimum);
}

function requireFlatFace(face: string): void {
  if (face === "top" || face === "bottom") return;
  throw new AirflowInputError({
    path: ["enterFrom"], code: "face_not_possible",
    detail: "The middle of a flat oval duct is entered from the top or the bottom; its ends get holes of their own. Lines along the major axis need the layout `custom`.",
  });
}
