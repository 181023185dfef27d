import { describe, expect, it } from "vitest";
import { fanAdjustment } from "@/lib/airflow/calculations/fanAdjustment";
import { reference, titleOf } from "./values";

const [stoecker, slower, faster] = reference["7_fan_laws"];

/** Half a unit in the last place that a value was printed with. */
const printed = (places: number): number => 0.5 * 10 ** -places;

describe(`fan laws against ${titleOf(stoecker!.source)} (${stoecker!.status})`, () => {
  const { fan } = fanAdjustment({
    fan: { speed: { value: 20 * 60, unit: "rpm" } },
    measured: { airflow: { value: 2.4, unit: "m3/s" }, staticPressure: { value: 340, unit: "Pa" }, power: { value: 1.8, unit: "kW" }, air: { dryBulb: { value: 20, unit: "degC" } } },
    design: { airflow: { value: 2.4, unit: "m3/s" }, air: { dryBulb: { value: 40, unit: "degC" } } },
    units: "si",
  });
  const { Q_m3_s, SP_Pa, P_kW } = stoecker!.value as { Q_m3_s: number; SP_Pa: number; P_kW: number };

  it(`${stoecker!.name}: ${P_kW} kW, read, to its printed digits`, () => expect(Math.abs(fan.power!.value - P_kW)).toBeLessThanOrEqual(printed(3)));
  it(`${stoecker!.name}: ${SP_Pa} Pa, computed, to its digits`, () => expect(Math.abs(fan.staticPressure!.value - SP_Pa)).toBeLessThanOrEqual(printed(2)));
  it("the airflow stays and so does the speed", () => {
    expect(fan.airflow.value / 1000).toBeCloseTo(Q_m3_s, 12);
    expect(fan.speed.value).toBeCloseTo(1200, 9);
  });
});

describe(`fan laws against ${titleOf(slower!.source)} (${slower!.status})`, () => {
  it(`${slower!.name}`, () => {
    const { cfm, SP_inwg, bhp } = slower!.value as { cfm: number; SP_inwg: number; bhp: number };
    const { fan } = fanAdjustment({
      fan: { speed: { value: 2000, unit: "rpm" } },
      measured: { airflow: { value: 6000, unit: "ft3/min" }, staticPressure: { value: 4, unit: "in_wg" }, power: { value: 6, unit: "hp" } },
      design: { airflow: { value: cfm, unit: "ft3/min" } },
    });
    expect(fan.speed.value).toBeCloseTo(1500, 9);
    expect(Math.abs(fan.staticPressure!.value - SP_inwg)).toBeLessThanOrEqual(printed(2));
    expect(Math.abs(fan.power!.value - bhp)).toBeLessThanOrEqual(printed(2));
  });

  it(`${faster!.name}`, () => {
    const { cfm, dp_in, kW } = faster!.value as { cfm: number; dp_in: number; kW: number };
    const airflow = (2000 * 1500) / 1300;
    const { fan } = fanAdjustment({
      fan: { speed: { value: 1300, unit: "rpm" } },
      measured: { airflow: { value: 2000, unit: "ft3/min" }, staticPressure: { value: 3, unit: "in_wg" }, power: { value: 1, unit: "kW" } },
      design: { airflow: { value: airflow, unit: "ft3/min" } },
    });
    expect(fan.speed.value).toBeCloseTo(1500, 9);
    expect(Math.abs(fan.airflow.value - cfm)).toBeLessThanOrEqual(printed(0));
    expect(Math.abs(fan.staticPressure!.value - dp_in)).toBeLessThanOrEqual(printed(2));
    expect(Math.abs(fan.power!.value * 0.745699871582 - kW)).toBeLessThanOrEqual(printed(2));
  });
});
