import fc from "fast-check";
import { describe, it } from "vitest";
import { airflow, type AirflowInput } from "@/lib/airflow/calculations/airflow";
import { averageVelocity } from "@/lib/airflow/calculations/averageVelocity";
import { densityCorrection } from "@/lib/airflow/calculations/densityCorrection";
import { ductArea } from "@/lib/airflow/calculations/ductArea";
import type { Air, Duct } from "@/lib/airflow/types";
import { writtenResolution } from "@/lib/airflow/uncertainty/readingInfluences";
import { fromSi, toSi } from "@/lib/airflow/units/convert";

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
/** Doubles below 1e-307 carry fewer digits than the tolerances here; no gauge shows a micropascal. */
const readable = (pascals: number): number => (pascals < 1e-6 ? 0 : pascals);
const metres = (value: number) => ({ value, unit: "m" as const });

const duct: fc.Arbitrary<Duct> = fc.oneof(
  fc.record({ shape: fc.constant("rectangular" as const), measured: fc.constant("inside" as const), width: between(0.1, 3).map(metres), height: between(0.1, 3).map(metres) }),
  fc.record({ shape: fc.constant("round" as const), measured: fc.constant("inside" as const), diameter: between(0.1, 3).map(metres) }),
  fc.tuple(between(0.1, 1), between(1, 3)).map(([minor, factor]) => ({ shape: "flat_oval" as const, measured: "inside" as const, minor: metres(minor), major: metres(minor * factor) })),
);
const air: fc.Arbitrary<Air> = fc.record({
  dryBulb: between(-20, 60).map((value) => ({ value, unit: "degC" as const })),
  relativeHumidity: between(0, 100).map((value) => ({ value, unit: "percent" as const })),
  barometricPressure: between(70, 105).map((value) => ({ value, unit: "kPa" as const })),
});
const velocities = fc.array(fc.array(between(1, 30), { minLength: 2, maxLength: 7 }), { minLength: 1, maxLength: 7 });
const of = (lines: number[][]) => ({ kind: "velocity" as const, unit: "m/s" as const, lines });
const close = (one: number, other: number, tolerance = 1e-9): boolean => Math.abs(one - other) <= tolerance * Math.max(1e-12, Math.abs(other));

describe("what must hold for any traverse", () => {
  it("scaling all readings scales the mean", () => {
    fc.assert(fc.property(velocities, between(0.5, 2), (lines, factor) => {
      const mean = averageVelocity({ readings: of(lines), units: "si" }).averageVelocity.value;
      const scaled = averageVelocity({ readings: of(lines.map((line) => line.map((reading) => reading * factor))), units: "si" }).averageVelocity.value;
      return close(scaled, mean * factor);
    }));
  });

  it("the order of the readings does not matter to the mean, with weights or without", () => {
    const shuffled = fc.array(fc.record({ reading: between(1, 30), weight: between(0.5, 4), place: between(0, 1) }), { minLength: 2, maxLength: 40 });
    fc.assert(fc.property(shuffled, fc.boolean(), (points, weighted) => {
      const meanOf = (order: typeof points): number =>
        averageVelocity({ readings: { ...of([order.map(({ reading }) => reading)]), ...(weighted && { weights: [order.map(({ weight }) => weight)] }) } }).averageVelocity.value;
      return close(meanOf(points), meanOf([...points].sort((one, other) => one.place - other.place)), 1e-12);
    }));
  });

  it("cutting the readings into other lines does not matter to the mean", () => {
    fc.assert(fc.property(velocities, (lines) => close(averageVelocity({ readings: of(lines) }).averageVelocity.value, averageVelocity({ readings: of([lines.flat()]) }).averageVelocity.value, 1e-12)));
  });

  it("the mean lies between the least and the greatest velocity", () => {
    fc.assert(fc.property(velocities, (lines) => {
      const { averageVelocity: mean, statistics } = averageVelocity({ readings: of(lines) });
      return mean.value >= statistics.minimum.value * (1 - 1e-12) && mean.value <= statistics.maximum.value * (1 + 1e-12);
    }));
  });

  // Up to 100 Pa no velocity is corrected for compressibility, so this is Jensen's inequality alone.
  it("averaging pressures never gives less than averaging velocities", () => {
    fc.assert(fc.property(fc.array(between(0, 100).map(readable), { minLength: 1, maxLength: 30 }), (pressures) => {
      const { averageVelocity: mean, averagingPressuresWouldGive } = averageVelocity({ readings: { kind: "velocity_pressure", unit: "Pa", lines: [pressures] } });
      return averagingPressuresWouldGive!.value >= mean.value * (1 - 1e-12);
    }));
  });

  it("scaling pressures scales the mean velocity by the root", () => {
    fc.assert(fc.property(fc.array(between(0, 40).map(readable), { minLength: 1, maxLength: 30 }), between(0.3, 2.5), (pressures, factor) => {
      const meanOf = (lines: number[]): number => averageVelocity({ readings: { kind: "velocity_pressure", unit: "Pa", lines: [lines] } }).averageVelocity.value;
      return close(meanOf(pressures.map((pressure) => pressure * factor)), meanOf(pressures) * Math.sqrt(factor));
    }));
  });

  it("ip and si requests for the same case agree", () => {
    fc.assert(fc.property(duct, air, velocities, (theDuct, theAir, lines) => {
      const inIp = (length: { value: number; unit: "m" }) => fromSi("length", toSi("length", length), "in");
      const ipDuct = Object.fromEntries(Object.entries(theDuct).map(([name, value]) => [name, typeof value === "object" ? inIp(value as { value: number; unit: "m" }) : value])) as unknown as Duct;
      const si = airflow({ duct: theDuct, air: theAir, readings: of(lines), instrument: { principle: "thermal" }, units: "si", standardAir: "ashrae" });
      const ip = airflow({
        duct: ipDuct, air: theAir, instrument: { principle: "thermal" }, units: "ip",
        readings: { kind: "velocity", unit: "ft/min", lines: lines.map((line) => line.map((reading) => fromSi("velocity", reading, "ft/min").value)) },
      });
      return (["actual", "standard"] as const).every((basis) => close(toSi("airflow", ip.airflow[basis]), toSi("airflow", si.airflow[basis]))) && close(toSi("massFlow", ip.airflow.mass), toSi("massFlow", si.airflow.mass));
    }));
  });

  it("doubling one side of a rectangle doubles its area, doubling a diameter quadruples it", () => {
    fc.assert(fc.property(between(0.1, 2), between(0.1, 2), (width, height) => {
      const rectangle = (w: number) => ductArea({ duct: { shape: "rectangular", measured: "inside", width: metres(w), height: metres(height) } }).area.value;
      const round = (d: number) => ductArea({ duct: { shape: "round", measured: "inside", diameter: metres(d) } }).area.value;
      return close(rectangle(2 * width), 2 * rectangle(width)) && close(round(2 * width), 4 * round(width));
    }));
  });

  it("a flat oval of equal axes is round, and one of any axes is a circle and a rectangle", () => {
    fc.assert(fc.property(between(0.1, 2), between(0, 3), (minor, straight) => {
      const oval = ductArea({ duct: { shape: "flat_oval", measured: "inside", minor: metres(minor), major: metres(minor + straight) }, units: "si" });
      const round = ductArea({ duct: { shape: "round", measured: "inside", diameter: metres(minor) }, units: "si" });
      return close(oval.area.value, round.area.value + straight * minor) && close(oval.perimeter.value, round.perimeter.value + 2000 * straight);
    }));
  });

  it("measured outside and inside, a duct has one area", () => {
    fc.assert(fc.property(duct, between(0, 0.1), between(0, 0.1), (theDuct, thickness, lining) => {
      const larger = Object.fromEntries(Object.entries(theDuct).map(([name, value]) => [name, typeof value === "object" ? metres((value as { value: number }).value + 2 * (thickness + lining)) : value]));
      const outside = { ...larger, measured: "outside", wall: { thickness: metres(thickness), lining: metres(lining) } } as unknown as Duct;
      return close(ductArea({ duct: outside }).area.value, ductArea({ duct: theDuct }).area.value);
    }));
  });

  it("mass is conserved: actual and standard airflow carry the same mass", () => {
    fc.assert(fc.property(duct, air, velocities, (theDuct, theAir, lines) => {
      const answer = airflow({ duct: theDuct, air: theAir, readings: of(lines), units: "si" });
      return close(toSi("airflow", answer.airflow.standard) * 1.2, toSi("massFlow", answer.airflow.mass));
    }));
  });

  it("correcting for density there and back is the identity", () => {
    fc.assert(fc.property(between(0.5, 2), between(0.5, 2), fc.constantFrom("differential_pressure" as const, "thermal" as const, "rotating_vane" as const), (one, other, principle) => {
      const at = (value: number) => ({ density: { value, unit: "kg/m3" as const } });
      const there = densityCorrection({ quantity: { value: 10, unit: "m/s" }, principle, from: at(one), to: at(other), units: "si" });
      const back = densityCorrection({ quantity: { value: there.corrected.value, unit: "m/s" }, principle, from: at(other), to: at(one), units: "si" });
      return close(back.corrected.value, 10);
    }));
  });

  it("humid air is lighter than dry air, and higher air than lower", () => {
    fc.assert(fc.property(between(0, 60), between(0, 3000), (celsius, altitude) => {
      const density = (humidity: number, height: number) =>
        airflow({ duct: { shape: "round", measured: "inside", diameter: metres(1) }, readings: of([[5]]), units: "si",
          air: { dryBulb: { value: celsius, unit: "degC" }, relativeHumidity: { value: humidity, unit: "percent" }, altitude: metres(height) } }).air.density.value;
      return density(100, altitude) < density(0, altitude) && density(50, altitude + 100) < density(50, altitude);
    }));
  });

  it("expanded uncertainty never shrinks when an influence grows", () => {
    const grown: ((input: AirflowInput, by: number) => AirflowInput)[] = [
      (input, by) => ({ ...input, uncertainty: { ...input.uncertainty, layoutPercent: 1 + by } }),
      (input, by) => ({ ...input, uncertainty: { ...input.uncertainty, sitePercent: by } }),
      (input, by) => ({ ...input, uncertainty: { ...input.uncertainty, densityPercent: by } }),
      (input, by) => ({ ...input, uncertainty: { ...input.uncertainty, fluctuationPercent: by } }),
      (input, by) => ({ ...input, uncertainty: { ...input.uncertainty, dimension: metres(by / 100) } }),
      (input, by) => ({ ...input, uncertainty: { ...input.uncertainty, resolution: by } }),
      (input, by) => ({ ...input, instrument: { principle: "thermal", accuracy: { percentOfReading: by } } }),
      (input, by) => ({ ...input, instrument: { principle: "thermal", accuracy: { absolute: { value: by, unit: "m/s" } } } }),
    ];
    fc.assert(fc.property(duct, velocities, fc.constantFrom(...grown), between(0, 5), between(0, 5), (theDuct, lines, grow, less, more) => {
      const input: AirflowInput = { duct: theDuct, readings: of(lines), units: "si" };
      const expanded = (by: number): number => airflow(grow(input, by)).uncertainty.expandedPercent;
      return expanded(less) <= expanded(less + more) + 1e-12;
    }));
  });
});

describe("the step that readings were written to", () => {
  const placesInText = (value: number): number => {
    const [mantissa = "", exponent = "0"] = String(value).split("e");
    return Math.min(12, Math.max(0, (mantissa.split(".")[1]?.length ?? 0) - Number(exponent)));
  };
  const written = fc.tuple(fc.integer({ min: -9_999_999, max: 9_999_999 }), fc.integer({ min: 0, max: 14 })).map(([whole, places]) => Number(`${whole}e-${places}`));

  it("is one in the last decimal place of any of them", () => {
    fc.assert(fc.property(fc.oneof(written, fc.double({ noNaN: true, noDefaultInfinity: true })), (value) => writtenResolution([[0, null], [value]]) === 10 ** -placesInText(value)));
  });
});
