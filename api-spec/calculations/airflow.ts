import { z } from "zod";
import { defineOperation } from "../define";
import { airflow as airflowQuantity, area, massFlow } from "../quantities";
import { airAnswer, check, designAnswer, uncertaintyAnswer, velocityAnswer, working } from "./answers";
import { EXHAUST_DUCT, EXHAUST_READINGS, LINED_SUPPLY_MAIN, SUPPLY_AIR, SUPPLY_READINGS } from "./examples";
import { air, answerOptions, design, duct, instrument, layoutRule, negativeReadings, probe, readings, site, standardAirName, uncertaintyOptions } from "./shapes";

export const airflow = defineOperation({
  id: "airflow",
  method: "post",
  path: "/calculations/airflow",
  tag: "Calculations",
  scope: "calculations",
  summary: "Airflow of a traverse",
  description:
    "Actual, standard and mass flow from a duct and its readings, with the average velocity, the checks of the traverse, an uncertainty budget, and the verdict against a design airflow: within, outside, or undecided where the measurement cannot tell.\n\nResults support, and do not replace, local codes, the project specification and licensed or certified practice.",
  body: z.strictObject({
    duct,
    readings,
    air: air.optional(),
    standardAir: standardAirName.optional(),
    probe: probe.optional(),
    instrument: instrument.optional(),
    layout: layoutRule.optional(),
    site: site.optional(),
    design: design.optional(),
    uncertainty: uncertaintyOptions.optional(),
    negativeReadings: negativeReadings.optional(),
    ...answerOptions,
  }),
  answer: z
    .strictObject({
      airflow: z.strictObject({ actual: airflowQuantity, standard: airflowQuantity, mass: massFlow }),
      ...velocityAnswer,
      area,
      air: airAnswer,
      checks: z.array(check),
      uncertainty: uncertaintyAnswer,
      design: designAnswer.nullable().describe("Null where no design was given."),
      working,
    })
    .meta({ id: "AirflowAnswer" }),
  problems: ["impossible-input"],
  figure: "The cross-section to scale with each reading where it was taken, coloured by velocity, suspected slips ringed.",
  examples: [
    {
      name: "supply-main",
      summary: "25 velocity pressures in a lined supply main at 1,640 ft, against design, with the working",
      body: {
        duct: LINED_SUPPLY_MAIN,
        readings: SUPPLY_READINGS,
        air: SUPPLY_AIR,
        layout: "log_tchebycheff" as const,
        site: { downstream: { value: 13, unit: "ft" as const }, upstream: { value: 5, unit: "ft" as const } },
        design: { airflow: { value: 3100, unit: "ft3/min" as const }, basis: "actual" as const, tolerancePercent: 10 },
        working: true,
      },
    },
    {
      name: "exhaust-duct",
      summary: "12 velocities in a round exhaust duct, in SI",
      body: { duct: EXHAUST_DUCT, readings: EXHAUST_READINGS, instrument: { principle: "rotating_vane" as const }, layout: "log_linear" as const, units: "si" as const },
    },
    {
      name: "flat-oval-thermal",
      summary: "A thermal instrument in a flat oval duct, one point not read",
      body: {
        duct: { shape: "flat_oval" as const, measured: "inside" as const, major: { value: 36, unit: "in" as const }, minor: { value: 14, unit: "in" as const } },
        readings: { kind: "velocity" as const, unit: "ft/min" as const, lines: [[840, 905, 918, 896, 832], [868, 941, null, 936, 861], [835, 902, 921, 899, 829]] },
        air: { dryBulb: { value: 74, unit: "degF" as const }, relativeHumidity: { value: 40, unit: "percent" as const }, altitude: { value: 1640, unit: "ft" as const } },
        instrument: { principle: "thermal" as const, assumedDensity: { value: 0.075, unit: "lb/ft3" as const }, accuracy: { percentOfReading: 3 } },
      },
    },
  ],
});
