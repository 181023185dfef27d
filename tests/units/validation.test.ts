import { describe, expect, it } from "vitest";
import { z } from "zod";
import { Problem, type ProblemFault } from "@/lib/problems/problem";
import { validate } from "@/lib/http/validation";

const quantity = z.strictObject({ value: z.number(), unit: z.enum(["in", "mm"]) });
const schema = z.strictObject({
  duct: z.discriminatedUnion("shape", [z.strictObject({ shape: z.literal("round"), diameter: quantity }), z.strictObject({ shape: z.literal("square"), side: quantity })]),
  air: z.union([z.strictObject({ dryBulb: quantity }), z.strictObject({ density: quantity })]).optional(),
  lines: z.array(z.array(z.number().nullable()).min(1)).min(1),
  "a/b~c": z.boolean().optional(),
});

function faults(value: unknown): ProblemFault[] {
  try {
    validate(schema, value);
  } catch (error) {
    if (error instanceof Problem) return error.details.errors ?? [];
    throw error;
  }
  return [];
}
const good = { duct: { shape: "round", diameter: { value: 1, unit: "in" } }, lines: [[1, null]] };

describe("validation", () => {
  it("lets a good request through", () => expect(faults(good)).toEqual([]));
  it("names a field that is not defined", () => expect(faults({ ...good, line: 1 })).toMatchObject([{ pointer: "/line", code: "unrecognized_field" }]));
  it("names an undefined field inside an object", () =>
    expect(faults({ ...good, duct: { ...good.duct, wall: 1 } })).toMatchObject([{ pointer: "/duct/wall", code: "unrecognized_field" }]));
  it("points at the object that lacks a field", () => {
    expect(faults({ lines: [[1]] })).toMatchObject([{ pointer: "", code: "missing_field", detail: expect.stringContaining('"duct"') }]);
    expect(faults({ ...good, duct: { shape: "round" } })).toMatchObject([{ pointer: "/duct", code: "missing_field", detail: expect.stringContaining('"diameter"') }]);
  });
  it("says which kinds there are", () => {
    expect(faults({ ...good, duct: { shape: "oval" } })).toMatchObject([{ pointer: "/duct/shape", code: "invalid_value" }]);
    expect(faults({ ...good, duct: {} })).toMatchObject([{ pointer: "/duct", code: "missing_field" }]);
  });
  it("points into the alternative that came nearest", () =>
    expect(faults({ ...good, air: { dryBulb: { value: "58", unit: "in" } } })).toMatchObject([{ pointer: "/air/dryBulb/value", code: "invalid_type" }]));
  it("points at a reading", () => expect(faults({ ...good, lines: [[1], [2, "3"]] })).toMatchObject([{ pointer: "/lines/1/1", code: "invalid_type", detail: "Expected a number, got a string." }]));
  it("counts what is too short", () => expect(faults({ ...good, lines: [] })).toMatchObject([{ pointer: "/lines", code: "too_small", detail: "Needs at least 1 entry." }]));
  it("escapes pointers as RFC 6901 asks", () => expect(faults({ ...good, "a/b~c": 1 })).toMatchObject([{ pointer: "/a~1b~0c", code: "invalid_type" }]));
  it("refuses a number too large for any machine", () => expect(faults({ ...good, lines: [[Infinity]] })).toMatchObject([{ pointer: "/lines/0/0", code: "invalid_type" }]));
  it("says what a whole body should be", () => {
    expect(faults([])).toMatchObject([{ pointer: "", code: "invalid_type" }]);
    expect(faults(null)).toMatchObject([{ pointer: "", code: "invalid_type" }]);
  });
  it("stops listing after fifty faults", () => expect(faults({ ...good, lines: [Array.from({ length: 900 }, () => "x")] })).toHaveLength(50));
});
