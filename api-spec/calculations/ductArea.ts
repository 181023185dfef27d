import { z } from "zod";
import { defineOperation } from "../define";
import { area, length } from "../quantities";
import { inside, working } from "./answers";
import { EXHAUST_DUCT, LINED_SUPPLY_MAIN } from "./examples";
import { answerOptions, duct } from "./shapes";

export const ductArea = defineOperation({
  id: "ductArea",
  method: "post",
  path: "/calculations/duct-area",
  tag: "Calculations",
  scope: "calculations",
  summary: "Area of a duct",
  description: "Inside dimensions, cross-sectional area, perimeter and hydraulic diameter of a rectangular, round or flat oval duct. Dimensions measured outside are reduced by sheet or board and lining, on both sides.",
  body: z.strictObject({ duct, ...answerOptions }),
  answer: z.strictObject({ inside, area, perimeter: length, hydraulicDiameter: length, working }).meta({ id: "DuctAreaAnswer" }),
  problems: ["impossible-input"],
  examples: [
    { name: "lined-rectangular", summary: "A supply main of 26 × 18 in outside, lined with 1 in, with its working", body: { duct: LINED_SUPPLY_MAIN, working: true } },
    { name: "round", summary: "An exhaust duct of 14 in, answered in SI", body: { duct: EXHAUST_DUCT, units: "si" as const } },
    {
      name: "flat-oval",
      summary: "A flat oval duct measured inside",
      body: { duct: { shape: "flat_oval" as const, measured: "inside" as const, major: { value: 900, unit: "mm" as const }, minor: { value: 350, unit: "mm" as const } }, units: "si" as const },
    },
  ],
});
