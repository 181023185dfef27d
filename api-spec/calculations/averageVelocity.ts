import { z } from "zod";
import { defineOperation } from "../define";
import { airAnswer, check, velocityAnswer, working } from "./answers";
import { EXHAUST_READINGS, SUPPLY_AIR, SUPPLY_READINGS } from "./examples";
import { air, answerOptions, instrument, negativeReadings, probe, readings, standardAirName } from "./shapes";

export const averageVelocity = defineOperation({
  id: "averageVelocity",
  method: "post",
  path: "/calculations/average-velocity",
  tag: "Calculations",
  scope: "calculations",
  summary: "Average velocity of a traverse",
  description:
    "The velocity at each point and their average, from velocity pressures or indicated velocities. Velocities are averaged, never pressures; the answer says what averaging the pressures would have given. Checks say whether the profile can be trusted.",
  body: z.strictObject({
    readings,
    air: air.optional(),
    standardAir: standardAirName.optional(),
    probe: probe.optional(),
    instrument: instrument.optional(),
    negativeReadings: negativeReadings.optional(),
    ...answerOptions,
  }),
  answer: z.strictObject({ ...velocityAnswer, air: airAnswer, checks: z.array(check), working }).meta({ id: "AverageVelocityAnswer" }),
  problems: ["impossible-input"],
  examples: [
    { name: "velocity-pressures", summary: "25 velocity pressures in a supply main", body: { readings: SUPPLY_READINGS, air: SUPPLY_AIR } },
    { name: "indicated-velocities", summary: "12 velocities of a rotating vane, in SI", body: { readings: EXHAUST_READINGS, instrument: { principle: "rotating_vane" as const }, units: "si" as const } },
  ],
});
