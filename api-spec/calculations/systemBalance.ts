import { z } from "zod";
import { defineOperation } from "../define";
import { airflow, ratio } from "../quantities";
import { working } from "./answers";
import { answerOptions } from "./shapes";

export const MOST_TERMINALS = 1_000;

const flow = {
  design: airflow,
  measured: airflow,
  difference: airflow.describe("Measured less design."),
  percentOfDesign: z.number(),
  verdict: z.enum(["within", "below", "above"]).describe("Against the tolerance."),
};

const terminal = z.strictObject({ name: z.string().min(1).max(100), design: airflow, measured: airflow }).meta({ id: "Terminal", description: "A terminal with its design and its measured airflow; for exhaust also as positive numbers." });

const inCubicFeet = (value: number) => ({ value, unit: "ft3/min" as const });
const inLitres = (value: number) => ({ value, unit: "L/s" as const });

export const systemBalance = defineOperation({
  id: "systemBalance",
  method: "post",
  path: "/calculations/system-balance",
  tag: "Calculations",
  scope: "calculations",
  summary: "Balance the terminals of a system",
  description:
    "Each terminal's percent of design, the key terminal (the lowest ratio of measured to design, which stays open), the order to adjust the others in, and what each would carry if the present total were shared in proportion. With the traverse of the main: the total against it and the apparent leakage.\n\n" +
    "Proportional balancing as it is commonly practised; the project specification decides. Terminals of smoke control and of laboratory containment need the responsible professional.",
  body: z.strictObject({
    terminals: z.array(terminal).min(1).max(MOST_TERMINALS),
    main: z.strictObject({ measured: airflow, design: airflow.optional().describe("The sum of the terminals' when left out.") }).optional().describe("The traverse of the main that serves these terminals."),
    tolerance: ratio.optional().describe("Either way from design; 10 percent when left out (common practice)."),
    ...answerOptions,
  }),
  answer: z
    .strictObject({
      terminals: z.array(
        z
          .strictObject({
            name: z.string(),
            ...flow,
            ratio: z.number().describe("Measured over design."),
            overLowest: z.number().describe("Its ratio over that of the key terminal."),
            order: z.int().describe("Place in the order of adjusting, 1 at the key terminal."),
            isKey: z.boolean(),
            proportionate: airflow.describe("Its share of what all carry now, in proportion to design."),
          })
          .meta({ id: "TerminalAnswer", description: "A terminal against design and the others." }),
      ),
      totals: z.strictObject({ ...flow, within: z.int().describe("Terminals within tolerance."), count: z.int() }).describe("Of all terminals together."),
      main: z.strictObject(flow).nullable().describe("The main against its design; null where it was not measured."),
      leakage: z
        .strictObject({ airflow: airflow.describe("Main less terminals; below 0 where the terminals carry more."), percentOfMain: z.number(), detail: z.string() })
        .nullable()
        .describe("Null where the main was not measured."),
      tolerancePercent: z.number(),
      working,
    })
    .meta({ id: "SystemBalanceAnswer" }),
  problems: ["impossible-input"],
  examples: [
    {
      name: "reading-room",
      summary: "Six diffusers of the reading room on AHU-1, with the traverse of their main",
      body: {
        terminals: [
          { name: "Reading room S-1", design: inCubicFeet(525), measured: inCubicFeet(571) },
          { name: "Reading room S-2", design: inCubicFeet(525), measured: inCubicFeet(538) },
          { name: "Reading room S-3", design: inCubicFeet(525), measured: inCubicFeet(502) },
          { name: "Stacks S-4", design: inCubicFeet(600), measured: inCubicFeet(519) },
          { name: "Stacks S-5", design: inCubicFeet(600), measured: inCubicFeet(488) },
          { name: "Entrance S-6", design: inCubicFeet(365), measured: inCubicFeet(401) },
        ],
        main: { measured: inCubicFeet(3149) },
        working: true,
      },
    },
    {
      name: "exhaust",
      summary: "Three exhaust grilles on EF-3, within 5 percent, in SI",
      body: {
        terminals: [
          { name: "Washroom E-1", design: inLitres(150), measured: inLitres(146) },
          { name: "Washroom E-2", design: inLitres(150), measured: inLitres(161) },
          { name: "Store E-3", design: inLitres(60), measured: inLitres(58) },
        ],
        main: { measured: inLitres(377), design: inLitres(360) },
        tolerance: { value: 5, unit: "percent" as const },
        units: "si" as const,
      },
    },
  ],
});
