import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { airDensity } from "@/api-spec/calculations/airDensity";
import { airflow } from "@/api-spec/calculations/airflow";
import { averageVelocity } from "@/api-spec/calculations/averageVelocity";
import { densityCorrection } from "@/api-spec/calculations/densityCorrection";
import { ductArea } from "@/api-spec/calculations/ductArea";
import { CALCULATIONS } from "@/lib/airflow/calculations";
import { AirflowInputError, type InputFault } from "@/lib/airflow/errors";
import { UNITS } from "@/lib/airflow/units/units";

type Json = string | number | boolean | null | Json[] | { [name: string]: Json };
type Path = (string | number)[];

const q = (value: number, unit: string) => ({ value, unit });

/** Bodies that name every field, so that a change anywhere is a change of something the engine reads. */
const AIR = { dryBulb: q(58, "degF"), relativeHumidity: q(85, "percent"), altitude: q(1640, "ft"), ductStaticPressure: q(1.2, "in_wg") };
const READ = { kind: "velocity_pressure", unit: "in_wg", lines: [[0.061, 0.074, null], [0.07, 0.082, 0.066]], weights: [[1, 2, 1], [1, 2, 1]] };
const REST = {
  probe: { coefficient: 0.99, diameter: q(0.3125, "in"), length: q(36, "in") },
  site: { downstream: q(13, "ft"), upstream: q(5, "ft") },
  design: { airflow: q(3100, "ft3/min"), basis: "standard", tolerancePercent: 10 },
  uncertainty: { dimension: q(1, "mm"), densityPercent: 0.5, layoutPercent: 1, sitePercent: 1, fluctuationPercent: 2, resolution: 0.001 },
  layout: "log_tchebycheff", standardAir: "epa", negativeReadings: "reject", units: "si", working: true,
};
const pressureInstrument = { principle: "differential_pressure", accuracy: { percentOfReading: 2, absolute: q(0.005, "in_wg") }, calibration: { gain: 1.01, offset: 0.001 } };
const thermalInstrument = { principle: "thermal", assumedDensity: q(0.075, "lb/ft3"), accuracy: { percentOfReading: 3, absolute: q(5, "ft/min") }, calibration: { gain: 0.98, offset: 4 } };

const OPERATIONS = [
  {
    definition: airflow, calculate: CALCULATIONS.airflow,
    bodies: [
      { duct: { shape: "rectangular", measured: "outside", width: q(26, "in"), height: q(18, "in"), wall: { thickness: q(0.05, "in"), lining: q(1, "in") } }, readings: READ, air: AIR, instrument: pressureInstrument, ...REST },
      { duct: { shape: "flat_oval", measured: "inside", major: q(900, "mm"), minor: q(400, "mm") }, readings: { kind: "velocity", unit: "ft/min", lines: [[840, 905], [868, 0]] }, air: { density: q(1.1, "kg/m3") }, instrument: thermalInstrument, ...REST },
      { duct: { shape: "round", measured: "outside", diameter: q(2, "ft"), wall: { thickness: q(1, "mm") } }, readings: { kind: "velocity_pressure", unit: "Pa", lines: [[-3, 1600, 1450]] }, working: true },
    ],
  },
  { definition: averageVelocity, calculate: CALCULATIONS["average-velocity"], bodies: [{ readings: READ, air: AIR, probe: REST.probe, instrument: pressureInstrument, standardAir: "normal", negativeReadings: "count_as_zero", units: "ip", working: true }] },
  {
    definition: airDensity, calculate: CALCULATIONS["air-density"],
    bodies: [
      { air: { dryBulb: q(25, "degC"), wetBulb: q(18, "degC"), barometricPressure: q(101.325, "kPa"), ductStaticPressure: q(-310, "Pa") }, standardAir: "iso", units: "si", working: true },
      { air: { dryBulb: q(298.15, "K"), dewPoint: q(12, "degC"), barometricPressure: q(29.9, "inHg") }, working: true },
      { air: { dryBulb: q(150, "degC"), humidityRatio: 0.3, altitude: q(-100, "m") }, working: true },
    ],
  },
  { definition: densityCorrection, calculate: CALCULATIONS["density-correction"], bodies: [{ quantity: q(240, "L/s"), principle: "thermal", from: "ashrae", to: AIR, units: "ip", working: true }, { quantity: q(900, "ft/min"), principle: "differential_pressure", from: { density: q(1.2, "kg/m3") }, to: "normal", working: true }] },
  { definition: ductArea, calculate: CALCULATIONS["duct-area"], bodies: [{ duct: { shape: "flat_oval", measured: "outside", major: q(36, "in"), minor: q(14, "in"), wall: { thickness: q(1, "mm"), lining: q(1, "in") } }, units: "si", working: true }] },
];

/** Where every number, word and field of a body stands. */
function placesIn(value: Json, path: Path = []): Path[] {
  if (value === null || typeof value !== "object") return [path];
  const children = Object.entries(value).flatMap(([name, child]) => placesIn(child, [...path, Array.isArray(value) ? Number(name) : name]));
  return path.length > 0 ? [path, ...children] : children;
}

function changed(value: Json, [step, ...rest]: Path, to: Json | undefined): Json {
  const copy = structuredClone(value) as Record<string | number, Json>;
  if (rest.length > 0) copy[step!] = changed(copy[step!]!, rest, to);
  else if (to === undefined) delete copy[step!];
  else copy[step!] = to;
  return copy as Json;
}

const UNIT_NAMES = Object.values(UNITS).flatMap((units) => Object.keys(units));
const replacement: fc.Arbitrary<Json | undefined> = fc.oneof(
  { weight: 3, arbitrary: fc.double({ min: -200, max: 2000, noNaN: true }) },
  { weight: 2, arbitrary: fc.constantFrom<Json>(0, -0, 1e-9, 5e-324, -1, 1, 100, 1e6, 1e9, -1e9, 1e300, 1.7976931348623157e308, -1.7976931348623157e308) },
  { weight: 2, arbitrary: fc.double({ noNaN: true, noDefaultInfinity: true }) },
  { weight: 2, arbitrary: fc.constantFrom<Json>(...UNIT_NAMES, "rotating_vane", "thermal", "differential_pressure", "inside", "outside", "ip", "si", "actual", "standard", "velocity", "reject", "count_as_zero", "custom") },
  { weight: 1, arbitrary: fc.constant(undefined) },
);

/** A body with one to four of its parts changed, as the schema admits it. */
const variantsOf = (body: Json): fc.Arbitrary<Json> => {
  const places = placesIn(body);
  return fc.array(fc.tuple(fc.nat(places.length - 1), replacement), { minLength: 1, maxLength: 4 }).map((changes) =>
    changes.reduce((one, [index, to]) => {
      try {
        return changed(one, places[index]!, to);
      } catch {
        return one; // The place went with an earlier change.
      }
    }, body),
  );
};

const pointsAtInput = ({ path, code, detail }: InputFault): boolean => path.length > 0 && /^[a-z0-9_]+$/.test(code) && detail.length > 10;

describe("whatever the schema admits is answered in finite numbers of the answer's shape, or refused with the place", () => {
  const cases = OPERATIONS.flatMap(({ definition, calculate, bodies }) => bodies.map((body, index) => ({ title: `${definition.id} ${index + 1}`, definition, calculate, body: body as Json })));

  it.each(cases)("$title", ({ definition, calculate, body }) => {
    expect(definition.body!.safeParse(body).success).toBe(true);
    let answered = 0;
    fc.assert(
      fc.property(variantsOf(body).filter((variant) => definition.body!.safeParse(variant).success), (variant) => {
        let answer: unknown;
        try {
          answer = (calculate as (input: unknown) => unknown)(definition.body!.parse(variant));
        } catch (error) {
          if (!(error instanceof AirflowInputError)) throw error;
          expect(error.faults.every(pointsAtInput)).toBe(true);
          return;
        }
        answered += 1;
        // The schema's numbers are finite ones.
        const checked = definition.answer!.safeParse(answer);
        expect(checked.success ? [] : checked.error.issues).toEqual([]);
      }),
      { numRuns: 1000 },
    );
    expect(answered).toBeGreaterThan(100);
  }, 60_000);
});
