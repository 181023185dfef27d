import { z } from "zod";
import { airflow, density, length, pressure, ratio, specificVolume, velocity } from "../quantities";
import { standardAirName } from "./shapes";

/** The parts that several answers have. */

const anyQuantity = z.strictObject({ value: z.number().describe("The number, not rounded."), unit: z.string().describe("Its unit; `1` for a bare ratio.") });

export const working = z
  .array(
    z
      .strictObject({
        step: z.string().describe("What the step finds."),
        equation: z.string().describe("In the field's symbols."),
        inputs: z.record(z.string(), anyQuantity).describe("What went in, by symbol."),
        value: anyQuantity.describe("What comes out."),
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
      "density_assumed", "probe_blockage", "compressibility", "near_wall", "duct_below_minimum", "probe_length",
    ]).describe("Stable code of the check."),
    passed: z.boolean().describe("Whether what was found is within the limit."),
    severity: z.enum(["information", "caution", "failure"]).describe("How much it weighs when it is not passed."),
    detail: z.string().describe("What was found and, where it is not passed, what to do about it."),
    compared: z
      .strictObject({
        quantity: z.string().describe("What was compared, in words."),
        value: z.number().nullable().describe("What was found."),
        limit: z.number().nullable().describe("What it was compared with."),
        unit: z.string().nullable().describe("Unit of both; null for counts and ratios."),
      })
      .describe("The comparison, so that it can be repeated."),
    source: z.string().describe("Where the limit comes from, and how surely."),
    at: z.array(z.strictObject({ line: z.int(), point: z.int() })).optional().describe("The readings concerned, counted from 1."),
  })
  .meta({ id: "Check", description: "A check of the plan or the result, with what was compared." });

/** What every answer about a traverse says of its velocities. */
export const velocityAnswer = {
  averageVelocity: velocity.describe("Mean of the velocities at the points."),
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
          origin: z.enum(["given", "default"]).describe("Whether the request gave it; a default is engineering judgement."),
          detail: z.string().describe("What it was taken from."),
        })
        .meta({ id: "Influence", description: "One row of the uncertainty budget." }),
    ),
    combinedPercent: z.number().describe("The rows in quadrature."),
    coverageFactor: z.number().describe("k."),
    expandedPercent: z.number().describe("k times the combined uncertainty, in percent of the airflow."),
    expanded: airflow.describe("Of the actual airflow."),
    note: z.string().describe("How the figure was made."),
  })
  .meta({ id: "Uncertainty", description: "How sure the airflow is, by the GUM." });

export const designAnswer = z
  .strictObject({
    airflow: airflow.describe("The design airflow."),
    basis: z.enum(["actual", "standard"]).describe("Which airflow was compared."),
    percent: z.number().describe("Measured over design, in percent."),
    difference: airflow.describe("Measured less design."),
    tolerancePercent: z.number().describe("Allowed difference, in percent of the design airflow."),
    expandedUncertainty: airflow.describe("Of the measured airflow on the design's basis."),
    verdict: z.enum(["within", "outside", "undecided"]).describe("`undecided`: the measurement cannot tell."),
  })
  .meta({ id: "DesignAnswer", description: "The airflow against its design." });

