import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { InsideDuct } from "@/lib/airflow/duct/insideDuct";
import { wallDistance } from "@/lib/airflow/layout/chord";
import { layoutLines } from "@/lib/airflow/layout/layoutLines";
import type { TraverseLine } from "@/lib/airflow/layout/line";
import { placeReadings } from "@/lib/airflow/layout/placeReadings";
import type { LayoutRequest } from "@/lib/airflow/layout/request";

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const even = (max: number) => fc.integer({ min: 1, max: max / 2 }).map((half) => 2 * half);
const face = fc.constantFrom("top" as const, "bottom" as const, "left" as const, "right" as const);
const flat = fc.constantFrom("top" as const, "bottom" as const);

const rectangle = fc.record({ shape: fc.constant("rectangular" as const), width: between(0.1, 3), height: between(0.1, 3) });
const pipe = fc.record({ shape: fc.constant("round" as const), diameter: between(0.1, 3) });
const oval = fc.tuple(between(0.1, 1), between(1.01, 4)).map(([minor, ratio]) => ({ shape: "flat_oval" as const, major: minor * ratio, minor }));

type Case = { inside: InsideDuct; request: LayoutRequest };
const cases = <Inside extends InsideDuct>(inside: fc.Arbitrary<Inside>, request: fc.Arbitrary<LayoutRequest>): fc.Arbitrary<Case> => fc.record({ inside, request });
const logSide = fc.constantFrom(5, 6, 7);
const depths = fc.uniqueArray(between(0.01, 0.99), { minLength: 1, maxLength: 6, selector: (depth) => Math.round(depth * 1000) }).map((list) => [...list].sort((one, other) => one - other));

/** Every rule in every shape it is for, with counts of one's own. */
const anyCase: fc.Arbitrary<Case> = fc.oneof(
  cases(rectangle, fc.record({ layout: fc.constant("log_tchebycheff" as const), points: fc.record({ across: logSide, down: logSide }), enterFrom: face })),
  cases(rectangle, fc.record({ layout: fc.constant("equal_area" as const), points: fc.record({ across: fc.integer({ min: 1, max: 12 }), down: fc.integer({ min: 1, max: 12 }) }), enterFrom: face })),
  cases(rectangle, fc.record({ layout: fc.constant("method_1" as const), points: fc.constantFrom({ across: 3, down: 4 }, { across: 7, down: 7 }, { across: 5, down: 5 }), enterFrom: face })),
  cases(pipe, fc.record({ layout: fc.constant("log_linear" as const), points: fc.record({ perDiameter: fc.constantFrom(4, 6, 8, 10), diameters: fc.constantFrom(2, 3) }), enterFrom: face })),
  cases(pipe, fc.record({ layout: fc.constant("equal_area" as const), points: fc.record({ perDiameter: even(30), diameters: fc.constantFrom(2, 3) }), enterFrom: face })),
  cases(pipe, fc.record({ layout: fc.constant("method_1" as const), points: fc.record({ perDiameter: even(24) }), enterFrom: face })),
  cases(oval, fc.record({ layout: fc.constantFrom("log_tchebycheff" as const, "equal_area" as const), points: fc.record({ across: fc.integer({ min: 1, max: 9 }), down: logSide, perDiameter: even(12) }), enterFrom: flat })),
  cases(fc.oneof(rectangle, oval), fc.record({ layout: fc.constant("custom" as const), points: fc.record({ lines: fc.array(fc.record({ at: between(0.01, 0.99), depths }), { minLength: 1, maxLength: 5 }) }), enterFrom: face })),
  cases(pipe, fc.record({ layout: fc.constant("custom" as const), points: fc.record({ lines: fc.array(fc.record({ angle: between(-180, 180), depths }), { minLength: 1, maxLength: 5 }) }), enterFrom: face })),
);

const WALL = 0.03;
const linesOf = ({ inside, request }: Case): TraverseLine[] => layoutLines({ inside, wall: WALL }, request);
const pointsOf = (one: Case) => linesOf(one).flatMap(({ points }) => points);
const scaled = (inside: InsideDuct, factor: number): InsideDuct =>
  Object.fromEntries(Object.entries(inside).map(([name, value]) => [name, typeof value === "number" ? value * factor : value])) as unknown as InsideDuct;

describe("what must hold for any plan", () => {
  it("its weights sum to 1 and none is 0", () => {
    fc.assert(fc.property(anyCase, (one) => {
      const weights = pointsOf(one).map(({ weight }) => weight);
      return weights.every((weight) => weight > 0) && Math.abs(weights.reduce((sum, weight) => sum + weight, 0) - 1) < 1e-12;
    }));
  });

  it("the mean of a field that is the same everywhere is that field", () => {
    fc.assert(fc.property(anyCase, between(0.1, 50), (one, field) => {
      const mean = pointsOf(one).reduce((sum, { weight }) => sum + weight * field, 0);
      return Math.abs(mean / field - 1) < 1e-12;
    }));
  });

  it("every point is inside the duct, and the line begins on its inside face", () => {
    fc.assert(fc.property(anyCase, (one) =>
      linesOf(one).every((line) => Math.abs(wallDistance(one.inside, line.start)) < 1e-9 && line.points.every((point) => wallDistance(one.inside, point) > 0)),
    ));
  });

  it("depths increase along a line and end before it does", () => {
    fc.assert(fc.property(anyCase, (one) =>
      linesOf(one).every(({ points, length }) => points.every(({ depth }, index) => depth > (points[index - 1]?.depth ?? 0) && depth < length)),
    ));
  });

  it("doubling the duct doubles the depths and the places of the holes", () => {
    // Method 1 keeps points a fixed distance off the wall, so its depths do not scale where they are near it.
    fc.assert(fc.property(anyCase.filter(({ request }) => request.layout !== "method_1"), (one) => {
      const small = linesOf(one);
      const large = layoutLines({ inside: scaled(one.inside, 2), wall: WALL }, one.request);
      const close = (value: number, expected: number): boolean => Math.abs(value - expected) < 1e-9;
      return large.every((line, l) => close(line.along, 2 * small[l]!.along) && line.points.every(({ depth }, p) => close(depth, 2 * small[l]!.points[p]!.depth)));
    }));
  });

  it("a hole is as far off on the outside as the wall makes it", () => {
    fc.assert(fc.property(anyCase, (one) => linesOf(one).every(({ wall, alongOutside, along }) => wall >= WALL - 1e-12 && alongOutside >= along - 1e-12)));
  });

  it("a rectangle read from the left is the one read from the top, turned", () => {
    fc.assert(fc.property(rectangle, logSide, logSide, (inside, across, down) => {
      const top = layoutLines({ inside, wall: 0 }, { layout: "log_tchebycheff", points: { across, down }, enterFrom: "top" });
      const left = layoutLines({ inside: { shape: "rectangular", width: inside.height, height: inside.width }, wall: 0 }, { layout: "log_tchebycheff", points: { across: down, down: across }, enterFrom: "left" });
      return top.every((line, l) => line.points.every(({ depth }, p) => Math.abs(depth - left[l]!.points[p]!.depth) < 1e-12));
    }));
  });

  it("readings in its shape are placed where it has its points", () => {
    fc.assert(fc.property(anyCase.filter(({ request }) => request.layout !== "custom"), (one) => {
      const lines = linesOf(one);
      fc.pre(lines.every(({ points }) => points.every(({ standsFor }) => standsFor === 1)));
      const { layout, enterFrom } = one.request;
      const placed = placeReadings({ inside: one.inside, wall: WALL }, lines.map(({ points }) => points.length), layout, enterFrom);
      expect(placed.byRule).toBe(true);
      expect(placed.lines).toEqual(lines);
    }));
  });

  it("readings of any shape find a place inside the duct", () => {
    const counts = fc.array(fc.integer({ min: 1, max: 12 }), { minLength: 1, maxLength: 12 });
    fc.assert(fc.property(fc.oneof(rectangle, pipe, oval), counts, face, (inside, perLine, enterFrom) => {
      const { lines } = placeReadings({ inside, wall: WALL }, perLine, undefined, enterFrom);
      return lines.every(({ points }, index) => points.length === perLine[index] && points.every((point) => wallDistance(inside, point) > 0));
    }));
  });
});
