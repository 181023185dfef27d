import { z } from "zod";
import { airflow, density, length, pressure, pressureUnit, ratio, temperature, velocity, velocityUnit } from "../quantities";

/** The shapes that several calculations take. */

export const MOST_POINTS = 1_000;
/** No calculation has use for a larger bare number; it keeps sums finite. */
const GREATEST_NUMBER = 1e9;
const bareNumber = z.number().min(-GREATEST_NUMBER).max(GREATEST_NUMBER);
const percent = z.number().min(0).max(100);

export const unitSystem = z.enum(["ip", "si"]).meta({ id: "UnitSystem", description: "Units of the answer: `ip` (default) inches, ft/min, ft³/min, lb/ft³; `si` mm, m/s, L/s, kg/m³." });
export const standardAirName = z
  .enum(["ashrae", "iso", "epa", "normal"])
  .meta({ id: "StandardAir", description: "`ashrae` 0.075 lb/ft³ (default for ip), `iso` 1.2 kg/m³ (default for si), `epa` dry at 68 °F and 29.92 inHg, `normal` dry at 0 °C and 101.325 kPa." });

/** Options of every calculation. */
export const answerOptions = {
  units: unitSystem.optional(),
  working: z.boolean().optional().describe("Whether the answer carries its working: each step with equation, inputs, value and source."),
};

const measured = z.enum(["inside", "outside"]).describe("Where the dimensions were measured. Outside ones are reduced by twice the wall.");
const wall = z
  .strictObject({ thickness: length.optional().describe("Sheet metal or board."), lining: length.optional().describe("Lining inside it.") })
  .optional()
  .describe("What lies between outside and inside on each face.");

export const duct = z
  .discriminatedUnion("shape", [
    z.strictObject({ shape: z.literal("rectangular"), measured, width: length.describe("Side to side."), height: length.describe("Top to bottom."), wall }).meta({ id: "RectangularDuct", description: "A rectangular duct." }),
    z.strictObject({ shape: z.literal("round"), measured, diameter: length.describe("Across the duct."), wall }).meta({ id: "RoundDuct", description: "A round duct." }),
    z.strictObject({ shape: z.literal("flat_oval"), measured, major: length.describe("The longer axis."), minor: length.describe("The shorter axis."), wall }).meta({ id: "FlatOvalDuct", description: "A flat oval duct: two half circles joined by a rectangle." }),
  ])
  .meta({ id: "Duct", description: "The duct at the plane of the traverse." });

const airState = z
  .strictObject({
    dryBulb: temperature.describe("Temperature of the air in the duct, −40 to 200 °C."),
    relativeHumidity: ratio.optional().describe("0 to 100 percent."),
    wetBulb: temperature.optional().describe("At most the dry bulb."),
    dewPoint: temperature.optional().describe("At most the dry bulb."),
    humidityRatio: bareNumber.optional().describe("Mass of water vapour per mass of dry air (kg/kg or lb/lb)."),
    altitude: length.optional().describe("Above sea level; the barometric pressure then follows the US Standard Atmosphere 1976."),
    barometricPressure: pressure.optional().describe("Station pressure, not reduced to sea level."),
    ductStaticPressure: pressure.optional().describe("Gauge pressure in the duct, below 0 on the suction side; 0 when left out."),
  })
  .meta({ id: "AirState", description: "Air by its state: at most one form of humidity (dry when left out) and one of altitude or barometric pressure (sea level when left out)." });
const knownDensity = z.strictObject({ density: density.describe("0.2 to 2.5 kg/m³.") }).meta({ id: "KnownDensity", description: "Air whose density is known." });
export const air = z.union([airState, knownDensity]).meta({ id: "Air", description: "The air in the duct: its state, or its density where that is known." });

const lines = z
  .array(z.array(z.number().nullable()).min(1))
  .min(1)
  .refine((rows) => rows.reduce((count, row) => count + row.length, 0) <= MOST_POINTS, { message: `A traverse has at most ${MOST_POINTS} points.`, params: { code: "too_many_points" } })
  .describe("One inner list for each hole or line, in the order read; null for a point that could not be read.");
const weights = z.array(z.array(z.number())).optional().describe("For custom layouts: a weight for each point, in the shape of lines.");

export const readings = z
  .discriminatedUnion("kind", [
    z.strictObject({ kind: z.literal("velocity_pressure"), unit: pressureUnit.describe("Of every reading, and of the calibration's offset."), lines, weights }).meta({ id: "VelocityPressureReadings", description: "Velocity pressures as read." }),
    z.strictObject({ kind: z.literal("velocity"), unit: velocityUnit.describe("Of every reading, and of the calibration's offset."), lines, weights }).meta({ id: "VelocityReadings", description: "Velocities as indicated." }),
  ])
  .meta({ id: "Readings", description: "The readings of a traverse, as written." });

export const instrumentPrinciple = z
  .enum(["differential_pressure", "thermal", "rotating_vane"])
  .meta({ id: "InstrumentPrinciple", description: "How the instrument senses velocity; it decides the density correction. An instrument that already compensates counts as `rotating_vane`." });

export const instrument = z
  .strictObject({
    principle: instrumentPrinciple,
    assumedDensity: density.optional().describe("Density that the instrument assumes; standard air when left out."),
    accuracy: z
      .strictObject({
        percentOfReading: percent.optional().describe("In percent of each reading."),
        absolute: z.union([pressure, velocity]).optional().describe("The same at every reading, in a unit of what was read."),
      })
      .optional()
      .describe("Limits of error: a share of the reading, an absolute part, or both."),
    calibration: z
      .strictObject({
        gain: z.number().min(0.5).max(2).optional().describe("1 when left out."),
        offset: bareNumber.optional().describe("0 when left out."),
      })
      .optional()
      .describe("The reading counts as gain × reading + offset, the offset in the unit of the readings."),
  })
  .meta({ id: "Instrument", description: "The instrument that was read." });

export const probe = z
  .strictObject({
    coefficient: z.number().optional().describe("1 when left out; 0.99 for a standard and 0.84 for an S-type tube in 40 CFR 60 Method 2."),
    diameter: length.optional().describe("Of the stem; the checks compare it with the duct."),
    length: length.optional().describe("Usable length, for the plan."),
  })
  .meta({ id: "Probe", description: "The pitot-static probe." });

export const site = z
  .strictObject({
    downstream: length.optional().describe("Straight length from the last disturbance to the plane."),
    upstream: length.optional().describe("Straight length from the plane to the next disturbance."),
  })
  .meta({ id: "Site", description: "How far the plane is from disturbances." });

export const layoutRule = z.enum(["log_tchebycheff", "log_linear", "equal_area", "method_1", "custom"]).meta({ id: "LayoutRule", description: "The rule that places the points." });

export const design = z
  .strictObject({
    airflow: airflow.describe("What the duct is meant to carry."),
    basis: z.enum(["actual", "standard"]).optional().describe("Which airflow the design means; actual when left out."),
    tolerancePercent: z.number().min(0).max(1_000).optional().describe("10 when left out (common practice)."),
  })
  .meta({ id: "Design", description: "The design airflow to compare with." });

export const uncertaintyOptions = z
  .strictObject({
    dimension: length.optional().describe("Half-width of each measured dimension; 1/16 in when left out."),
    densityPercent: percent.optional().describe("Relative standard uncertainty of the density; 0.5 when left out."),
    layoutPercent: percent.optional().describe("Of the layout and its count; 1 to 2 by the layout's rule when left out."),
    sitePercent: percent.optional().describe("Of the site; 0, 1 or 1.5 by the straight lengths when left out."),
    fluctuationPercent: percent.optional().describe("Relative standard deviation of a single reading; 2 when left out."),
    resolution: z.number().min(0).max(GREATEST_NUMBER).optional().describe("Step of the readings, in their unit; taken from their digits when left out."),
  })
  .meta({ id: "UncertaintyOptions", description: "Uncertainties that you know better than the defaults." });

export const negativeReadings = z.enum(["count_as_zero", "reject"]).describe("What becomes of a reading below zero; it counts as zero when left out.");
