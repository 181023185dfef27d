import { z } from "zod";
import { DIMENSIONS, FIGURES, SLIPS } from "@/lib/airflow/reconciliation/slip";
import { defineOperation } from "../define";
import { airflow, area, length, pressureUnit, velocityUnit } from "../quantities";
import { working } from "./answers";
import { LINED_SUPPLY_MAIN, SUPPLY_AIR, SUPPLY_READINGS } from "./examples";
import { air, answerOptions, duct, instrument, MOST_POINTS, probe, readings, standardAirName } from "./shapes";

const GREATEST_TOTAL = 1e9;

const reported = z
  .strictObject({
    total: z.number().min(-GREATEST_TOTAL).max(GREATEST_TOTAL).optional().describe("Sum of the readings, in their unit; or of the velocities found from velocity pressures, in the unit of the average. Whichever it is nearer to is meant."),
    count: z.int().min(1).max(2 * MOST_POINTS).optional().describe("Readings counted."),
    average: z
      .strictObject({ value: z.number().describe("The number with the digits reported."), unit: z.enum([...velocityUnit.options, ...pressureUnit.options]).describe("A unit of velocity; for velocity pressures also one of pressure.") })
      .optional()
      .describe("The average velocity, or the mean velocity pressure."),
    dimensions: z.strictObject(Object.fromEntries(DIMENSIONS.map((name) => [name, length.optional()])) as Record<(typeof DIMENSIONS)[number], z.ZodOptional<typeof length>>).optional().describe("Inside dimensions as they were used."),
    area: area.optional().describe("Taken as given where no duct is."),
    airflow: airflow.optional(),
    basis: z.enum(["actual", "standard"]).optional().describe("Which airflow was reported; actual when left out."),
  })
  .meta({ id: "Reported", description: "What somebody reported, each figure with the digits it was written with. All parts are optional; one is needed." });

const figureName = z.enum(FIGURES);
const slip = {
  slip: z.enum(SLIPS),
  at: z.strictObject({ line: z.int(), point: z.int() }).optional().describe("The reading it touches, counted from 1."),
  figure: figureName.optional().describe("The figure it touches, where it is not a reading."),
  read: z.number().nullable().describe("What stands on the sheet, or what the figure ought to be."),
  used: z.number().nullable().describe("What the slip made of it; null for a reading left out."),
  unit: z.string().nullable().describe("Unit of `read` and `used`; null for a count."),
  detail: z.string().describe("The slip in words."),
};

const explanation = z
  .strictObject({
    ...slip,
    also: z.array(z.strictObject(slip).meta({ id: "Slip", description: "A suspected slip." })).describe("A second slip that is needed as well, or rounding beneath the first; empty where one slip does."),
    explains: z.array(figureName).describe("The disagreeing figures that it reproduces."),
    figures: z.array(z.strictObject({ figure: figureName, value: z.number() })).describe("Every figure as it comes out with the slip, in the unit reported."),
    assumptions: z.int().describe("What ranks explanations of equally much: one for each slip, one more where a reading or figure had to be picked to fit."),
    rank: z.int().describe("1 for the best."),
    tied: z.boolean().describe("Whether another explanation has the same rank: the figures cannot tell them apart."),
  })
  .meta({ id: "Explanation", description: "A slip that would explain what disagrees." });

const figure = z
  .strictObject({
    figure: figureName,
    reported: z.number(),
    recomputed: z.number(),
    difference: z.number().describe("Reported less recomputed."),
    unit: z.string().nullable().describe("Unit of the three; null for a count."),
    rounding: z.number().describe("Half the step of the last digit reported. Zeros at the end of a whole number count as rounding, down to three digits, except in a total."),
    withinRounding: z.boolean(),
  })
  .meta({ id: "ReconciledFigure", description: "A reported figure against the one recomputed." });

/** The sheet of the examples: velocities in the supply main of AHU-1. */
const SUPPLY_VELOCITIES = {
  kind: "velocity" as const,
  unit: "ft/min" as const,
  lines: [[1018, 1062, 1094, 1055, 1004], [1066, 1117, 1154, 1113, 1048], [1063, 1124, 1156, 1108, 1054], [1010, 1054, 1103, 1057, 1010]],
};

export const reconciliation = defineOperation({
  id: "reconciliation",
  method: "post",
  path: "/calculations/reconciliation",
  tag: "Calculations",
  scope: "calculations",
  summary: "Find the slip behind a reported figure",
  description:
    "Takes the readings as written and what somebody reported of them, recomputes each figure, and says which slips would explain a difference: a digit misread, a reading left out, the wrong count, outside dimensions, pressures averaged and so on. Rounding is looked at first, then single slips, then pairs; a slip is told only if it reproduces the reported figures and spoils none that agrees. Where several explain it equally well, all are told as tied; where none does, the answer says so.\n\n" +
    "An explanation is a suspicion that fits the figures, not a proof: go back to the sheet or the duct before anything is changed.",
  body: z.strictObject({
    duct: duct.optional().describe("Needed for an area, for dimensions, and for an airflow without an area."),
    readings,
    air: air.optional(),
    standardAir: standardAirName.optional(),
    probe: probe.optional(),
    instrument: instrument.optional(),
    reported,
    ...answerOptions,
  }),
  answer: z
    .strictObject({
      figures: z.array(figure),
      conclusion: z.enum(["agrees", "explained", "explained_by_two_slips", "partly_explained", "unexplained"]),
      detail: z.string().describe("The conclusion in words."),
      explanations: z.array(explanation).describe("Best first, at most 100."),
      omitted: z.int().describe("Further explanations that were found and are not listed; of each kind no more than 2,000 are looked for."),
      working,
    })
    .meta({ id: "ReconciliationAnswer" }),
  problems: ["impossible-input"],
  examples: [
    {
      name: "one-digit",
      summary: "A total 60 short: one digit of one reading misread while adding up",
      body: {
        duct: LINED_SUPPLY_MAIN,
        readings: SUPPLY_VELOCITIES,
        reported: { total: 21410, count: 20, average: { value: 1070.5, unit: "ft/min" as const }, area: { value: 2.667, unit: "ft2" as const }, airflow: { value: 2855, unit: "ft3/min" as const } },
      },
    },
    {
      name: "outside-dimensions",
      summary: "An airflow 22 % too high: the lining was not subtracted",
      body: {
        duct: LINED_SUPPLY_MAIN,
        readings: SUPPLY_VELOCITIES,
        reported: { total: 21470, count: 20, average: { value: 1073.5, unit: "ft/min" as const }, area: { value: 3.25, unit: "ft2" as const }, airflow: { value: 3489, unit: "ft3/min" as const } },
        working: true,
      },
    },
    {
      name: "density-ignored",
      summary: "Velocity pressures at 1,640 ft, worked out as if it were standard air",
      body: { duct: LINED_SUPPLY_MAIN, readings: SUPPLY_READINGS, air: SUPPLY_AIR, reported: { average: { value: 1111, unit: "ft/min" as const }, airflow: { value: 2962, unit: "ft3/min" as const } } },
    },
  ],
});
