import { describe, expect, it } from "vitest";
import { fanAdjustment, type FanAdjustmentInput } from "@/lib/airflow/calculations/fanAdjustment";

const input = (changes: { fan?: Partial<FanAdjustmentInput["fan"]>; measured?: Partial<FanAdjustmentInput["measured"]>; design?: Partial<FanAdjustmentInput["design"]> } = {}): FanAdjustmentInput => ({
  fan: { speed: { value: 1000, unit: "rpm" }, maximumSpeed: { value: 1500, unit: "rpm" }, motorPower: { value: 5, unit: "hp" }, ...changes.fan },
  measured: { airflow: { value: 4000, unit: "ft3/min" }, staticPressure: { value: 1.5, unit: "in_wg" }, power: { value: 2, unit: "hp" }, ...changes.measured },
  design: { airflow: { value: 4800, unit: "ft3/min" }, ...changes.design },
});
const codes = (changes: Parameters<typeof input>[0] = {}): string[] => fanAdjustment(input(changes)).warnings.map(({ code }) => code);

describe("a fan brought to its design airflow", () => {
  it("changes with the first, second and third power of the speed", () => {
    const { fan, ratios } = fanAdjustment(input());
    expect(ratios.speed).toBeCloseTo(1.2, 12);
    expect(fan.speed).toEqual({ value: expect.closeTo(1200, 9), unit: "rpm" });
    expect(fan.staticPressure).toEqual({ value: expect.closeTo(1.5 * 1.44, 9), unit: "in_wg" });
    expect(fan.power).toEqual({ value: expect.closeTo(2 * 1.728, 9), unit: "hp" });
    expect(fan.motorLoad).toEqual({ value: expect.closeTo(69.12, 9), unit: "percent" });
  });

  it("keeps its speed and sheds pressure and power in thinner air", () => {
    const density = (value: number) => ({ density: { value, unit: "kg/m3" as const } });
    const { fan } = fanAdjustment({ ...input({ measured: { air: density(1.2) }, design: { airflow: { value: 4000, unit: "ft3/min" }, air: density(0.9) } }), units: "si" });
    expect(fan.speed.value).toBeCloseTo(1000, 9);
    expect(fan.staticPressure!.value).toBeCloseTo(1.5 * 249.08891 * 0.75, 6);
    expect(fan.power!.value).toBeCloseTo(2 * 0.7456998715822702 * 0.75, 9);
    expect(fan.density).toEqual({ value: expect.closeTo(0.9, 12), unit: "kg/m3" });
  });

  it("says nothing of what was not measured", () => {
    const { fan } = fanAdjustment(input({ measured: { staticPressure: undefined, power: undefined } }));
    expect(fan).toMatchObject({ staticPressure: null, power: null, motorLoad: null });
  });

  it("shows speed, pressure and power step by step", () => {
    const { working } = fanAdjustment({ ...input(), working: true });
    expect(working!.map(({ step }) => step)).toEqual(["Ratio of airflow", "Ratio of density", "Speed", "Static pressure", "Power"]);
    expect(fanAdjustment(input()).working).toBeUndefined();
  });
});

describe("its warnings", () => {
  it.each([
    ["a motor with room and a speed within its class", {}, []],
    ["a motor beyond its nameplate", { fan: { motorPower: { value: 3, unit: "hp" } } }, ["motor_overloaded"]],
    ["a motor near its nameplate", { fan: { motorPower: { value: 3.6, unit: "hp" } } }, ["motor_near_nameplate"]],
    ["a motor of which nothing is known", { fan: { motorPower: undefined } }, ["motor_not_checked"]],
    ["a speed beyond the class", { fan: { maximumSpeed: { value: 1100, unit: "rpm" } } }, ["speed_above_maximum"]],
    ["a speed near the greatest of the class", { fan: { maximumSpeed: { value: 1250, unit: "rpm" } } }, ["speed_near_maximum"]],
    ["a class of which nothing is known", { fan: { maximumSpeed: undefined } }, ["speed_not_checked"]],
    ["a large step", { design: { airflow: { value: 5200, unit: "ft3/min" } } }, ["large_change"]],
  ] as const)("for %s", (_, changes, expected) => {
    expect(codes(changes as never).filter((code) => code !== "system_unchanged" && code !== "lock_out")).toEqual(expected);
    expect(codes(changes as never)).toEqual(expect.arrayContaining(["system_unchanged", "lock_out"]));
  });

  it("leave out the drive where the speed stays", () => expect(codes({ design: { airflow: { value: 4000, unit: "ft3/min" } } })).not.toContain("lock_out"));
});

describe("what no fan does is refused, with the place", () => {
  it.each([
    [{ fan: { speed: { value: 0, unit: "rpm" } } }, ["fan", "speed"]],
    [{ measured: { airflow: { value: -1, unit: "ft3/min" } } }, ["measured", "airflow"]],
    [{ design: { airflow: { value: 1e12, unit: "ft3/min" } } }, ["design", "airflow"]],
    [{ measured: { air: { density: { value: 9, unit: "kg/m3" } } } }, ["measured", "air", "density"]],
  ] as const)("%#", (changes, path) => {
    expect(() => fanAdjustment(input(changes as never))).toThrowError(expect.objectContaining({ faults: [expect.objectContaining({ path })] }));
  });
});
