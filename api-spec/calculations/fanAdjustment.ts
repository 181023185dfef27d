import { z } from "zod";
import { FAN_WARNINGS } from "@/lib/airflow/fan/fanWarnings";
import { defineOperation } from "../define";
import { airflow, density, power, pressure, ratio, speed } from "../quantities";
import { working } from "./answers";
import { SUPPLY_AIR } from "./examples";
import { air, answerOptions, standardAirName } from "./shapes";

export const fanAdjustment = defineOperation({
  id: "fanAdjustment",
  method: "post",
  path: "/calculations/fan-adjustment",
  tag: "Calculations",
  scope: "calculations",
  summary: "Bring a fan to its design airflow",
  description:
    "Speed, static pressure and power of a fan at its design airflow, by the fan laws: airflow with the speed, pressure with its square, power with its cube, pressure and power also with the density of the air. Warnings name what has to be looked at before the speed is changed: the motor's nameplate, the greatest speed of the fan's class, how far the fan laws reach.\n\n" +
    "Lock out and tag out the fan before reaching in. Results support, and do not replace, local codes, the project specification and licensed or certified practice.",
  body: z.strictObject({
    fan: z
      .strictObject({
        speed: speed.describe("As measured."),
        maximumSpeed: speed.optional().describe("The greatest of the fan's class."),
        motorPower: power.optional().describe("Of the motor's nameplate."),
      })
      .meta({ id: "Fan", description: "The fan and its limits." }),
    measured: z
      .strictObject({
        airflow,
        staticPressure: pressure.optional().describe("Of the fan, above 0."),
        power: power.optional().describe("Taken at the shaft."),
        air: air.optional().describe("Standard air when left out."),
      })
      .meta({ id: "FanMeasured", description: "The fan as it was measured." }),
    design: z.strictObject({ airflow, air: air.optional().describe("As measured when left out.") }).meta({ id: "FanDesign", description: "The airflow wanted." }),
    standardAir: standardAirName.optional(),
    ...answerOptions,
  }),
  answer: z
    .strictObject({
      fan: z
        .strictObject({
          speed,
          airflow,
          staticPressure: pressure.nullable().describe("Null where it was not measured."),
          power: power.nullable().describe("Null where it was not measured."),
          density,
          motorLoad: ratio.nullable().describe("Power over the motor's nameplate; null where either is not known."),
        })
        .meta({ id: "FanAtDesign", description: "The fan at its design airflow." }),
      ratios: z.strictObject({ speed: z.number(), airflow: z.number(), density: z.number(), staticPressure: z.number(), power: z.number() }).describe("New over measured."),
      warnings: z.array(
        z
          .strictObject({ code: z.enum(FAN_WARNINGS), severity: z.enum(["information", "caution", "failure"]), detail: z.string(), source: z.string() })
          .meta({ id: "FanWarning", description: "What to look at before the speed is changed." }),
      ),
      working,
    })
    .meta({ id: "FanAdjustmentAnswer" }),
  problems: ["impossible-input"],
  examples: [
    {
      name: "more-air",
      summary: "AHU-1 is 9 % short of design: the motor would nearly be at its nameplate",
      body: {
        fan: { speed: { value: 940, unit: "rpm" as const }, maximumSpeed: { value: 1250, unit: "rpm" as const }, motorPower: { value: 3, unit: "hp" as const } },
        measured: { airflow: { value: 2863, unit: "ft3/min" as const }, staticPressure: { value: 1.62, unit: "in_wg" as const }, power: { value: 2.1, unit: "hp" as const }, air: SUPPLY_AIR },
        design: { airflow: { value: 3140, unit: "ft3/min" as const } },
        working: true,
      },
    },
    {
      name: "exhaust-slower",
      summary: "EF-3 moves too much and is slowed down, in SI",
      body: {
        fan: { speed: { value: 1420, unit: "rpm" as const }, motorPower: { value: 0.75, unit: "kW" as const } },
        measured: { airflow: { value: 520, unit: "L/s" as const }, staticPressure: { value: 180, unit: "Pa" as const }, power: { value: 0.31, unit: "kW" as const } },
        design: { airflow: { value: 460, unit: "L/s" as const } },
        units: "si" as const,
      },
    },
  ],
});
