import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { airDensity } from "@/lib/airflow/calculations/airDensity";
import { airflow, type AirflowInput } from "@/lib/airflow/calculations/airflow";
import { averageVelocity } from "@/lib/airflow/calculations/averageVelocity";
import { densityCorrection } from "@/lib/airflow/calculations/densityCorrection";
import { ductArea } from "@/lib/airflow/calculations/ductArea";
import { AirflowInputError } from "@/lib/airflow/errors";
import type { Air, Duct, Readings } from "@/lib/airflow/types";

const q = <U extends string>(value: number, unit: U) => ({ value, unit });
const F = (value: number) => q(value, "degF");
const C = (value: number) => q(value, "degC");
const percent = (value: number) => q(value, "percent");

const ROUND: Duct = { shape: "round", measured: "inside", diameter: q(14, "in") };
const OUTSIDE: Duct = { shape: "round", measured: "outside", diameter: q(4, "in") };
const READINGS: Readings = { kind: "velocity", unit: "ft/min", lines: [[900, 1000], [1000, 1100]] };
const PRESSURES: Readings = { kind: "velocity_pressure", unit: "Pa", lines: [[30, 40]] };
const MEASURED: AirflowInput = { duct: ROUND, readings: READINGS };

const ofDuct = (duct: Duct) => () => ductArea({ duct });
const ofAir = (air: Air) => () => airDensity({ air });
const ofReadings = (readings: Partial<Readings>) => () => averageVelocity({ readings: { ...READINGS, ...readings } as Readings });
const ofTraverse = (input: Partial<AirflowInput>) => () => airflow({ ...MEASURED, ...input });

/** What is refused, where it stands in the input, and by which code. */
const REFUSALS: [what: string, calculate: () => unknown, at: string, code: string][] = [
  ["a dimension of 0", ofDuct({ ...ROUND, diameter: q(0, "in") }), "duct/diameter", "dimension_not_positive"],
  ["a negative dimension", ofDuct({ ...ROUND, diameter: q(-3, "in") }), "duct/diameter", "dimension_not_positive"],
  ["a dimension of a mile", ofDuct({ ...ROUND, diameter: q(5280, "ft") }), "duct/diameter", "dimension_too_large"],
  ["a dimension that is a slip in the unit", ofDuct({ ...ROUND, diameter: q(0.4, "mm") }), "duct/diameter", "dimension_too_small"],
  ["lining that fills the duct", ofDuct({ ...OUTSIDE, wall: { lining: q(2, "in") } }), "duct/diameter", "inside_dimension_not_positive"],
  ["board and lining that together fill it", ofDuct({ ...OUTSIDE, wall: { thickness: q(1, "in"), lining: q(1, "in") } }), "duct/diameter", "inside_dimension_not_positive"],
  ["a negative lining", ofDuct({ ...OUTSIDE, wall: { lining: q(-1, "in") } }), "duct/wall/lining", "negative_wall"],
  ["a negative wall", ofDuct({ ...OUTSIDE, wall: { thickness: q(-1, "mm") } }), "duct/wall/thickness", "negative_wall"],
  ["a negative wall, though the duct was measured inside", ofDuct({ ...ROUND, wall: { thickness: q(-1, "in") } }), "duct/wall/thickness", "negative_wall"],
  ["a flat oval taller than wide", ofDuct({ shape: "flat_oval", measured: "inside", major: q(10, "in"), minor: q(12, "in") }), "duct/minor", "minor_exceeds_major"],

  ["two humidities", ofAir({ dryBulb: F(70), relativeHumidity: percent(50), dewPoint: F(50) }), "air/dewPoint", "two_humidities"],
  ["two pressures", ofAir({ dryBulb: F(70), altitude: q(0, "ft"), barometricPressure: q(29.9, "inHg") }), "air/barometricPressure", "two_pressures"],
  ["humidity over 100 %", ofAir({ dryBulb: F(70), relativeHumidity: percent(101) }), "air/relativeHumidity", "humidity_out_of_range"],
  ["humidity below 0 %", ofAir({ dryBulb: F(70), relativeHumidity: percent(-1) }), "air/relativeHumidity", "humidity_out_of_range"],
  ["a humidity ratio in grams", ofAir({ dryBulb: F(70), humidityRatio: 8 }), "air/humidityRatio", "humidity_out_of_range"],
  ["more water than the air can hold", ofAir({ dryBulb: F(40), humidityRatio: 0.02 }), "air/humidityRatio", "humidity_over_saturation"],
  ["steam by relative humidity", ofAir({ dryBulb: C(150), relativeHumidity: percent(100) }), "air/relativeHumidity", "vapour_exceeds_pressure"],
  ["steam by wet bulb", ofAir({ dryBulb: C(150), wetBulb: C(110) }), "air/wetBulb", "vapour_exceeds_pressure"],
  ["steam by dew point", ofAir({ dryBulb: C(150), dewPoint: C(110) }), "air/dewPoint", "vapour_exceeds_pressure"],
  ["a wet bulb above the dry bulb", ofAir({ dryBulb: F(70), wetBulb: F(71) }), "air/wetBulb", "wet_bulb_above_dry_bulb"],
  ["a wet bulb lower than dry air has", ofAir({ dryBulb: F(100), wetBulb: F(20) }), "air/wetBulb", "wet_bulb_too_low"],
  ["a wet bulb of −150 °C", ofAir({ dryBulb: F(70), wetBulb: C(-150) }), "air/wetBulb", "temperature_out_of_range"],
  ["a dew point above the dry bulb", ofAir({ dryBulb: F(70), dewPoint: F(71) }), "air/dewPoint", "dew_point_above_dry_bulb"],
  ["a dew point of −150 °C", ofAir({ dryBulb: F(70), dewPoint: C(-150) }), "air/dewPoint", "temperature_out_of_range"],
  ["air hotter than the equations hold", ofAir({ dryBulb: C(250) }), "air/dryBulb", "temperature_out_of_range"],
  ["air colder than the equations hold", ofAir({ dryBulb: C(-41) }), "air/dryBulb", "temperature_out_of_range"],
  ["an altitude in the wrong unit", ofAir({ dryBulb: F(70), altitude: q(16_400, "m") }), "air/altitude", "altitude_out_of_range"],
  ["an altitude where the air is too thin", ofAir({ dryBulb: F(20), altitude: q(6_000, "m") }), "air/altitude", "pressure_out_of_range"],
  ["a pressure no site has", ofAir({ dryBulb: F(70), barometricPressure: q(20, "kPa") }), "air/barometricPressure", "pressure_out_of_range"],
  ["a static pressure that bursts the duct", ofAir({ dryBulb: F(70), ductStaticPressure: q(40, "kPa") }), "air/ductStaticPressure", "pressure_out_of_range"],
  ["a density no air has", ofAir({ density: q(7.5, "lb/ft3") }), "air/density", "density_out_of_range"],

  ["points of which none was read", ofReadings({ lines: [[null], [null, null]] }), "readings/lines", "no_readings"],
  ["a velocity beyond Mach 0.25", ofReadings({ lines: [[900, 1e9]] }), "readings/lines/0/1", "reading_out_of_range"],
  ["a velocity pressure in the wrong unit", ofReadings({ kind: "velocity_pressure", unit: "inHg", lines: [[8]] } as Partial<Readings>), "readings/lines/0/0", "reading_out_of_range"],
  ["weights for other lines", ofReadings({ weights: [[1, 1]] }), "readings/weights", "weights_do_not_fit"],
  ["weights for other points", ofReadings({ weights: [[1, 1], [1]] }), "readings/weights/1", "weights_do_not_fit"],
  ["a weight of 0", ofReadings({ weights: [[1, 1], [1, 0]] }), "readings/weights/1/1", "weights_do_not_fit"],
  ["a reading below zero, where that was asked for", () => averageVelocity({ readings: { ...READINGS, lines: [[900, -50]] }, negativeReadings: "reject" }), "readings/lines/0/1", "negative_reading"],

  ["a probe coefficient of 84", ofTraverse({ readings: PRESSURES, probe: { coefficient: 84 } }), "probe/coefficient", "coefficient_out_of_range"],
  ["a probe thicker than a metre", ofTraverse({ probe: { diameter: q(8, "m") } }), "probe/diameter", "probe_diameter_out_of_range"],
  ["an instrument that assumed water", ofTraverse({ instrument: { principle: "thermal", assumedDensity: q(1000, "kg/m3") } }), "instrument/assumedDensity", "density_out_of_range"],
  ["an accuracy in another quantity's unit", ofTraverse({ readings: PRESSURES, instrument: { principle: "differential_pressure", accuracy: { absolute: q(5, "ft/min") } } }), "instrument/accuracy/absolute", "accuracy_unit_differs"],
  ["an accuracy below zero", ofTraverse({ instrument: { principle: "thermal", accuracy: { absolute: q(-5, "ft/min") } } }), "instrument/accuracy/absolute", "accuracy_out_of_range"],
  ["a half-width below zero", ofTraverse({ uncertainty: { dimension: q(-1, "mm") } }), "uncertainty/dimension", "uncertainty_out_of_range"],
  ["a straight length below zero", ofTraverse({ site: { downstream: q(-1, "m"), upstream: q(3, "m") } }), "site/downstream", "straight_length_out_of_range"],
  ["a design of 0", ofTraverse({ design: { airflow: q(0, "ft3/min") } }), "design/airflow", "design_out_of_range"],
  ["a quantity beyond any instrument", () => densityCorrection({ quantity: q(1e300, "ft/min"), principle: "thermal", from: "ashrae", to: "iso" }), "quantity", "quantity_out_of_range"],
  ["an air to correct from that cannot be", () => densityCorrection({ quantity: q(1, "m/s"), principle: "thermal", from: { dryBulb: C(20), wetBulb: C(25) }, to: "iso" }), "from/wetBulb", "wet_bulb_above_dry_bulb"],
];

/** What a calculation refuses: where it stands in the input, and by which code. Nothing where it answers. */
function faultsOf(calculate: () => unknown): { path: string; code: string }[] {
  try {
    calculate();
  } catch (error) {
    if (error instanceof AirflowInputError) return error.faults.map(({ path, code }) => ({ path: path.join("/"), code }));
    throw error;
  }
  return [];
}

describe("what cannot be is refused, with its place", () => {
  it.each(REFUSALS)("%s", (_, calculate, at, code) => {
    expect(faultsOf(calculate)).toEqual([{ path: at, code }]);
    expect(calculate).toThrow(/^[A-Z].*[.?]$/);
  });

  it("names every wrong dimension and every wrong reading, not only the first", () => {
    expect(faultsOf(ofDuct({ shape: "rectangular", measured: "inside", width: q(-1, "in"), height: q(0, "in") })).map(({ path: at }) => at)).toEqual(["duct/width", "duct/height"]);
    expect(faultsOf(ofReadings({ lines: [[1e308, 900], [900, -1e9]] })).map(({ path: at }) => at)).toEqual(["readings/lines/0/0", "readings/lines/1/1"]);
  });

  it("leaves out no code that these parts of the engine have", () => {
    const engine = path.join(import.meta.dirname, "../../lib/airflow");
    const codes = ["air", "duct", "readings", "velocity", "uncertainty"].flatMap((folder) =>
      readdirSync(path.join(engine, folder)).flatMap((file) => [...readFileSync(path.join(engine, folder, file), "utf8").matchAll(/(?:code: |refuse\()"([a-z_]+)"/g)].map(([, code]) => code!)),
    );
    const covered = new Set(REFUSALS.map(([, , , code]) => code));
    expect(codes.length).toBeGreaterThan(20);
    expect(codes.filter((code) => !covered.has(code))).toEqual([]);
  });
});

describe("the edges of the range are inside it", () => {
  it.each<[string, () => unknown]>([
    ["−40 °C", ofAir({ dryBulb: C(-40) })],
    ["−40 °F", ofAir({ dryBulb: F(-40) })],
    ["233.15 K", ofAir({ dryBulb: q(233.15, "K") })],
    ["200 °C", ofAir({ dryBulb: C(200) })],
    ["392 °F", ofAir({ dryBulb: F(392) })],
    ["50 kPa", ofAir({ dryBulb: C(20), barometricPressure: q(50, "kPa") })],
    ["120 kPa", ofAir({ dryBulb: C(20), barometricPressure: q(120, "kPa") })],
    ["saturated air by its dew point", ofAir({ dryBulb: F(70), dewPoint: F(70) })],
    ["saturated air by its wet bulb", ofAir({ dryBulb: F(70), wetBulb: F(70) })],
    ["saturated air by its relative humidity", ofAir({ dryBulb: F(70), relativeHumidity: percent(100) })],
    ["5 kPa", ofReadings({ kind: "velocity_pressure", unit: "kPa", lines: [[5]] } as Partial<Readings>)],
    ["100 m/s", ofReadings({ unit: "m/s", lines: [[100]] } as Partial<Readings>)],
    ["a flat oval that is round", ofDuct({ shape: "flat_oval", measured: "inside", major: q(12, "in"), minor: q(12, "in") })],
  ])("%s", (_, calculate) => expect(faultsOf(calculate)).toEqual([]));
});
