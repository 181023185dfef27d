import { z } from "zod";
import { defineOperation } from "../define";
import { airflow, density, velocity, velocityOrAirflow } from "../quantities";
import { working } from "./answers";
import { air, answerOptions, instrumentPrinciple, standardAirName } from "./shapes";

const airOrStandard = z.union([standardAirName, air]).describe("Air by its state or density, or a standard air by its name.");

export const densityCorrection = defineOperation({
  id: "densityCorrection",
  method: "post",
  path: "/calculations/density-correction",
  tag: "Calculations",
  scope: "calculations",
  summary: "Correct an indicated velocity or airflow for density",
  description:
    "From what the instrument indicated, assuming one air (`from`), to what was there in another (`to`). The instrument's principle decides: √(ρ₀/ρ) where it senses differential pressure, ρ₀/ρ where it is thermal, 1 for a rotating vane or an instrument that already compensates.",
  body: z.strictObject({ quantity: velocityOrAirflow, principle: instrumentPrinciple, from: airOrStandard, to: airOrStandard, ...answerOptions }),
  answer: z
    .strictObject({
      corrected: z.union([velocity, airflow]).describe("The velocity or airflow that was there."),
      factor: z.number().describe("What the indication was multiplied by."),
      fromDensity: density.describe("Of the air that the instrument assumed."),
      toDensity: density.describe("Of the air that was there."),
      working,
    })
    .meta({ id: "DensityCorrectionAnswer" }),
  problems: ["impossible-input"],
  examples: [
    {
      name: "thermal-at-altitude",
      summary: "A thermal instrument that shows standard velocity, used at 5,000 ft",
      body: {
        quantity: { value: 1000, unit: "ft/min" as const },
        principle: "thermal" as const,
        from: "ashrae" as const,
        to: { dryBulb: { value: 70, unit: "degF" as const }, altitude: { value: 5000, unit: "ft" as const } },
        working: true,
      },
    },
    {
      name: "hood-airflow",
      summary: "An airflow from a differential pressure instrument, from 1.2 kg/m³ to the air's real density",
      body: {
        quantity: { value: 240, unit: "L/s" as const },
        principle: "differential_pressure" as const,
        from: { density: { value: 1.2, unit: "kg/m3" as const } },
        to: { density: { value: 1.09, unit: "kg/m3" as const } },
        units: "si" as const,
      },
    },
  ],
});
