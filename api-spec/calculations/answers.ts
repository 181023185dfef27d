import { z } from "zod";
import { airflow, density, length, pressure, ratio, specificVolume, velocity } from "../quantities";
import { standardAirName } from "./shapes";

/** The parts that several answers have. */

const anyQuantity = z.strictObject({ value: z.number(), unit: z.string() });

export const working = z
  .array(
    z
      .strictObject({
        step: z.string().describe("What the step finds."),
        equation: z.string(),
        inputs: z.record(z.string(), anyQuantity).describe("What went in, by symbol."),
        value: anyQuantity,
        source: z.string().describe("Standard, handbook or definition."),
      })
      .meta({ id: "WorkingStep", description: "One step of the arithmetic, complete enough to be redone by hand." }),
  )
  .optional()
  .describe("Where it was asked for.");

export const inside = z
  .discriminatedUnion("shape", [
    z.strictObject({ shape: z.literal("rectangular"), width: length, height: length }),
    z.strictObject({ shape: z.literal("round"), diameter: length }),
    z.strictObject({ shape: z.literal("flat_oval"), major: length, minor: length }),
  ])
  .meta({ id: "InsideDimensions", description: "The duct's inside." });

export const airAnswer = z
  .strictObject({
    density,
    densityRatio: z.number().describe("Density over that of the standard air."),
    standardAir: z.strictObject({ name: standardAirName, density }),
    absolutePressure: pressure.nullable().describe("Barometric plus duct static; null where only the density was given."),
    humidityRatio: z.number().nullable().describe("kg/kg; null where only the density was given."),
    specificVolume,
    assumed: z.array(z.enum(["standard_air", "dry_air", "sea_level"])).describe("What was taken for granted."),
  })
  .meta({ id: "AirAnswer", description: "The air, and what was assumed of it." });

export const check = z
  .strictObject({
    code: z.enum([
      "points_below_minimum", "uniformity", "negative_reading", "low_velocity", "site_disturbance", "profile_asymmetry", "possible_slip",
      "density_assumed", "probe_blockage", "compressibility", "near_wall", "duct_below_minimum",
    ]),
    passed: z.boolean(),
    severity: z.enum(["information", "caution", "failure"]).describe("How much it weighs when it is not passed."),
    detail: z.string(),
    compared: z.strictObject({ quantity: z.string(), value: z.number().nullable(), limit: z.number().nullable(), unit: z.string().nullable() }),
    source: z.string(),
    at: z.array(z.strictObject({ line: z.int(), point: z.int() })).optional().describe("The readings concerned, counted from 1."),
  })
  .meta({ id: "Check", description: "A check of the plan or the result, with what was compared." });

/** What every answer about a traverse says of its velocities. */
export const velocityAnswer = {
  averageVelocity: velocity,
  points: z.array(z.strictObject({ line: z.int(), point: z.int(), velocity })).describe("The actual velocity at each point that was read."),
  statistics: z
    .strictObject({
      count: z.int().describe("Points in the average."),
      skipped: z.int().describe("Points that could not be read."),
      minimum: velocity,
      maximum: velocity,
      standardDeviation: velocity,
      coefficientOfVariation: ratio,
    })
    .meta({ id: "VelocityStatistics", description: "How the velocities spread." }),
  averagingPressuresWouldGive: velocity.nullable().describe("The velocity that averaging the pressures would have given, which is too high; null for velocity readings."),
};

export const uncertaintyAnswer = z
  .strictObject({
    budget: z.array(
      z
        .strictObject({
          name: z.enum(["instrument", "fluctuation", "layout", "site", "area", "density", "rounding"]),
          percent: z.number().describe("Relative standard uncertainty of the airflow from this influence, in percent."),
          origin: z.enum(["given", "default"]),
          detail: z.string(),
        })
        .meta({ id: "Influence", description: "One row of the uncertainty budget." }),
    ),
    combinedPercent: z.number(),
    coverageFactor: z.number(),
    expandedPercent: z.number(),
    expanded: airflow.describe("Of the actual airflow."),
    note: z.string(),
  })
  .meta({ id: "Uncertainty", description: "How sure the airflow is, by the GUM." });

export const designAnswer = z
  .strictObject({
    airflow,
    basis: z.enum(["actual", "standard"]),
    percent: z.number().describe("Measured over design, in percent."),
    difference: airflow.describe("Measured less design."),
    tolerancePercent: z.number(),
    expandedUncertainty: airflow.describe("Of the measured airflow on the design's basis."),
    verdict: z.enum(["within", "outside", "undecided"]).describe("`undecided`: the measurement cannot tell."),
  })
  .meta({ id: "DesignAnswer", description: "The airflow against its design." });

