import { z } from "zod";
import { defineOperation } from "../define";
import { airAnswer, working } from "./answers";
import { SUPPLY_AIR } from "./examples";
import { air, answerOptions, standardAirName } from "./shapes";

export const airDensity = defineOperation({
  id: "airDensity",
  method: "post",
  path: "/calculations/air-density",
  tag: "Calculations",
  scope: "calculations",
  summary: "Density of the air in a duct",
  description: "Density, density ratio to a standard air, absolute pressure, humidity ratio and specific volume of humid air, from dry bulb, one form of humidity, altitude or barometric pressure, and the duct's static pressure. From −40 to 200 °C and 50 to 120 kPa absolute.",
  body: z.strictObject({ air, standardAir: standardAirName.optional(), ...answerOptions }),
  answer: airAnswer.extend({ working }).meta({ id: "AirDensityAnswer" }),
  problems: ["impossible-input"],
  examples: [
    { name: "supply-air", summary: "Cool, humid supply air at 1,640 ft, 1.2 in wg in the duct", body: { air: SUPPLY_AIR, working: true } },
    {
      name: "wet-bulb",
      summary: "Dry and wet bulb with a barometer, in SI",
      body: {
        air: { dryBulb: { value: 25, unit: "degC" as const }, wetBulb: { value: 18, unit: "degC" as const }, barometricPressure: { value: 101.325, unit: "kPa" as const } },
        units: "si" as const,
      },
    },
  ],
});
