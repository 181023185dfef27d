import { z } from "zod";
import { CALCULATIONS } from "@/lib/airflow/calculations";
import { defineOperation } from "../define";

/** The calculations a batch may mix, by the last part of their path. */
export type BatchOperationName = keyof typeof CALCULATIONS;
const BATCH_OPERATIONS = Object.keys(CALCULATIONS) as [BatchOperationName, ...BatchOperationName[]];

export const MOST_BATCH_ITEMS = 1_000;
export const MOST_BATCH_LINES = 100_000;

/** One item of a batch; its input is validated by the operation it names, so that one bad item does not fail the rest. */
export const batchItem = z
  .strictObject({
    operation: z.enum(BATCH_OPERATIONS).describe("The calculation, as the last part of its path."),
    input: z.unknown().describe("What that calculation takes."),
  })
  .meta({ id: "BatchItem", description: "One calculation of a batch." });

const batchResult = z
  .object({
    index: z.int().describe("Which item this answers, counted from 0."),
    status: z.int().describe("The HTTP status the calculation would have had by itself."),
    result: z.unknown().optional().describe("The calculation's answer, where it succeeded."),
    problem: z.unknown().optional().describe("The problem, where it did not; pointers are into the batch (JSON) or the line (NDJSON)."),
  })
  .meta({ id: "BatchResult", description: "The outcome of one item." });

export const batch = defineOperation({
  id: "batch",
  method: "post",
  path: "/calculations/batch",
  tag: "Calculations",
  scope: "calculations",
  summary: "Run many calculations at once",
  description:
    `Any mix of the calculations, answered in order; one bad item never fails the rest. As \`application/json\`: up to ${MOST_BATCH_ITEMS.toLocaleString("en")} items in one body of at most 8 MiB. ` +
    `As \`application/x-ndjson\`: one item a line, up to ${MOST_BATCH_LINES.toLocaleString("en")} lines, answered line by line while they arrive. Each item counts as one request of the month's quota.`,
  body: z.strictObject({ items: z.array(z.unknown()).min(1).max(MOST_BATCH_ITEMS).describe("Items as in BatchItem.") }),
  answer: z.object({ items: z.array(batchResult) }).meta({ id: "BatchAnswer" }),
  maxBodyBytes: 8 * 1024 ** 2,
  examples: [
    {
      name: "two-ducts",
      summary: "The area of the supply main and the airflow of the exhaust duct, in one request",
      body: {
        items: [
          {
            operation: "duct-area",
            input: { duct: { shape: "rectangular", measured: "outside", width: { value: 26, unit: "in" }, height: { value: 18, unit: "in" }, wall: { lining: { value: 1, unit: "in" } } } },
          },
          {
            operation: "airflow",
            input: {
              duct: { shape: "round", measured: "inside", diameter: { value: 14, unit: "in" } },
              readings: { kind: "velocity", unit: "ft/min", lines: [[812, 934, 1010, 1004, 921, 806], [798, 926, 1013, 1009, 930, 811]] },
            },
          },
        ],
      },
    },
  ],
});
