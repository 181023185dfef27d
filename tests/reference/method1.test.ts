import { describe, expect, it } from "vitest";
import { annulusPositions } from "@/lib/airflow/layout/equalArea";
import * as method1 from "@/lib/airflow/layout/method1";
import { METHOD_1_GRIDS, METHOD_1_LEAST_DIAMETER, method1Minimum, wallLimit } from "@/lib/airflow/layout/method1";
import type { InsideDuct } from "@/lib/airflow/duct/insideDuct";
import { hydraulicDiameter } from "@/lib/airflow/duct/hydraulicDiameter";
import { reference, titleOf } from "./values";

const points = reference["4_traverse_points"];
const fact = (name: string) => points.epa_method1.find((entry) => entry.name === name)!;
const metres = (value: number) => ({ value, unit: "m" as const });
const round = (diameter: number): InsideDuct => ({ shape: "round", diameter });
const square = (side: number): InsideDuct => ({ shape: "rectangular", width: side, height: side });
/** Straight lengths in diameters of the duct. */
const site = (inside: InsideDuct, downstream: number, upstream: number) => ({
  downstream: metres(downstream * hydraulicDiameter(inside)),
  upstream: metres(upstream * hydraulicDiameter(inside)),
});

describe("40 CFR Part 60, Appendix A-1, Method 1", () => {
  const { printed_percent, printed_status, computed_percent } = points.epa_table_1_2;

  it.each(Object.entries(printed_percent))(`Table 1-2, %s points on a diameter: every entry is the closed form, rounded (${printed_status})`, (count, printed) => {
    expect(annulusPositions(Number(count)).map((position) => Math.round(position * 1000) / 10)).toEqual(printed);
  });

  it.each(Object.entries(computed_percent))("Table 1-2, %s points on a diameter: to four decimals (computed outside the project)", (count, computed) => {
    for (const [index, percent] of computed.entries()) expect(100 * annulusPositions(Number(count))[index]!).toBeCloseTo(percent, 4);
  });

  it(`Table 1-1 has the printed grids (${points.epa_table_1_1.status})`, () => {
    const ours = Object.fromEntries(METHOD_1_GRIDS.map(([more, fewer]) => [more * fewer, `${more}x${fewer}`]));
    expect(ours).toEqual(points.epa_table_1_1.value);
  });

  it(`the fewest points with 8 and 2 diameters: 12, or in smaller ducts 8 round and 9 rectangular (${fact("minimum points when 8/2 is met").status})`, () => {
    const minimum = (inside: InsideDuct): number => method1Minimum(inside, site(inside, 8, 2));
    expect({ "D>0.61 m": minimum(round(0.62)), "round 0.30-0.61 m": minimum(round(0.61)), "rect De 0.30-0.61 m": minimum(square(0.3)) }).toEqual(fact("minimum points when 8/2 is met").value);
    expect(minimum(square(0.7))).toBe(12);
  });

  it(`16 nearer to a disturbance, and where nothing is known (${fact("Figure 1-2 velocity steps").status}, ${fact("Figure 1-2 velocity steps").note})`, () => {
    const { near } = fact("Figure 1-2 velocity steps").value as { near: number };
    expect(method1Minimum(round(1), site(round(1), 5, 2))).toBe(near);
    expect(method1Minimum(round(1), site(round(1), 8, 1))).toBe(near);
    expect(method1Minimum(round(1))).toBe(near);
  });

  it(`has the straight lengths of its text: ${String(fact("site").value)} (read: ${titleOf("M1")})`, () => {
    const { METHOD_1_DOWNSTREAM_DIAMETERS: downstream, METHOD_1_UPSTREAM_DIAMETERS: upstream, METHOD_1_LEAST_DOWNSTREAM_DIAMETERS: leastDownstream, METHOD_1_LEAST_UPSTREAM_DIAMETERS: leastUpstream } = method1;
    expect(`>= ${downstream} D downstream and >= ${upstream} D upstream of a disturbance; fallback >= ${leastDownstream} D and >= ${leastUpstream} D`).toBe(fact("site").value);
  });

  it(`is not for ducts under 0.30 m (read: ${titleOf("M1")})`, () => {
    expect(METHOD_1_LEAST_DIAMETER).toBe((fact("not applicable below").value as { D_m: number }).D_m);
  });

  it(`keeps points 1 in off the wall over 0.61 m, 0.5 in up to it (${fact("near-wall limit").status}: ${JSON.stringify(fact("near-wall limit").value)})`, () => {
    expect(wallLimit(round(0.62))).toBeCloseTo(0.0254, 12);
    expect(wallLimit(round(0.61))).toBeCloseTo(0.0127, 12);
  });
});
