import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { proportionalBalance } from "@/lib/airflow/balance/proportionalBalance";
import { systemBalance, type SystemBalanceInput } from "@/lib/airflow/calculations/systemBalance";

const cubicFeet = (value: number) => ({ value, unit: "ft3/min" as const });
const terminal = (name: string, design: number, measured: number) => ({ name, design: cubicFeet(design), measured: cubicFeet(measured) });
const ROOM: SystemBalanceInput = { terminals: [terminal("A", 500, 550), terminal("B", 400, 320), terminal("C", 300, 270), terminal("D", 200, 240)] };

describe("a system of terminals", () => {
  it("has its key terminal at the lowest ratio and an order that rises from there", () => {
    const { terminals } = systemBalance(ROOM);
    expect(terminals.map(({ name, order, isKey }) => [name, order, isKey])).toEqual([["A", 3, false], ["B", 1, true], ["C", 2, false], ["D", 4, false]]);
    expect(terminals.map(({ ratio }) => ratio)).toEqual([1.1, 0.8, 0.9, 1.2].map((value) => expect.closeTo(value, 12)));
    expect(terminals.map(({ overLowest }) => overLowest)).toEqual([1.375, 1, 1.125, 1.5].map((value) => expect.closeTo(value, 12)));
  });

  it("is judged terminal by terminal and as a whole, at 10 % when nothing is said", () => {
    const { terminals, totals, tolerancePercent } = systemBalance(ROOM);
    expect(tolerancePercent).toBeCloseTo(10, 12);
    expect(terminals.map(({ verdict }) => verdict)).toEqual(["within", "below", "within", "above"]);
    expect(totals).toMatchObject({ verdict: "within", within: 2, count: 4, percentOfDesign: expect.closeTo((100 * 1380) / 1400, 9) });
  });

  it("is judged by the tolerance it is given", () => {
    const { terminals } = systemBalance({ ...ROOM, tolerance: { value: 5, unit: "percent" } });
    expect(terminals.map(({ verdict }) => verdict)).toEqual(["above", "below", "below", "above"]);
  });

  it("leaks what the main carries and the terminals do not", () => {
    const { leakage, main } = systemBalance({ ...ROOM, main: { measured: cubicFeet(1500) } });
    expect(leakage).toMatchObject({ airflow: { value: expect.closeTo(120, 9), unit: "ft3/min" }, percentOfMain: expect.closeTo(8, 9) });
    expect(main!.percentOfDesign).toBeCloseTo((100 * 1500) / 1400, 9);
  });

  it("says that leakage cannot be where the terminals carry more than the main", () => {
    const { leakage } = systemBalance({ ...ROOM, main: { measured: cubicFeet(1300) } });
    expect(leakage!.airflow.value).toBeCloseTo(-80, 9);
    expect(leakage!.detail).toContain("which leakage cannot do");
  });

  it("says nothing of leakage where the main was not measured", () => expect(systemBalance(ROOM)).toMatchObject({ main: null, leakage: null }));
  it("stands still where nothing moves", () => expect(systemBalance({ terminals: [terminal("A", 500, 0), terminal("B", 500, 0)] }).terminals.map(({ order, percentOfDesign }) => [order, percentOfDesign])).toEqual([[1, 0], [2, 0]]));
  it("shows each ratio and the leakage step by step", () => expect(systemBalance({ ...ROOM, main: { measured: cubicFeet(1500) }, working: true }).working!.map(({ step }) => step)).toEqual(["Ratio of A", "Ratio of B", "Ratio of C", "Ratio of D", "Ratio of all terminals", "Apparent leakage"]));

  it.each([
    [{ terminals: [terminal("A", 0, 10)] }, ["terminals", 0, "design"]],
    [{ terminals: [terminal("A", 10, -1)] }, ["terminals", 0, "measured"]],
    [{ ...ROOM, main: { measured: cubicFeet(0) } }, ["main", "measured"]],
    [{ ...ROOM, tolerance: { value: -1, unit: "percent" } }, ["tolerance"]],
    [{ terminals: [] }, ["terminals"]],
  ] as const)("is refused with the place: %#", (input, path) => expect(() => systemBalance(input as never)).toThrowError(expect.objectContaining({ faults: [expect.objectContaining({ path })] })));
});

describe("proportional balancing", () => {
  const flows = fc.array(fc.record({ design: fc.double({ min: 0.01, max: 10, noNaN: true }), measured: fc.double({ min: 0, max: 10, noNaN: true }) }), { minLength: 1, maxLength: 30 });

  it("orders every terminal once, by rising ratio, and shares exactly what they carry", () => {
    fc.assert(
      fc.property(flows, (terminals) => {
        const standings = proportionalBalance(terminals);
        const inOrder = [...standings].sort((first, second) => first.order - second.order);
        expect(inOrder.map(({ order }) => order)).toEqual(terminals.map((_, index) => index + 1));
        for (const [index, { ratio }] of inOrder.entries()) expect(ratio).toBeGreaterThanOrEqual(inOrder[index - 1]?.ratio ?? 0);
        const total = terminals.reduce((sum, { measured }) => sum + measured, 0);
        expect(standings.reduce((sum, { proportionate }) => sum + proportionate, 0)).toBeCloseTo(total, 8);
      }),
      { seed: 5 },
    );
  });
});
