import { z } from "zod";
import { defineOperation } from "../define";
import { day } from "./common";

const MOST_DAYS = 92;
const DAY_MS = 86_400_000;

export const readUsage = defineOperation({
  id: "readUsage", method: "get", path: "/usage", tag: "Usage", scope: "usage:read",
  summary: "Read the organisation's usage",
  description: `Requests by day, key and operation, in UTC days, of both environments unless one is named; at most ${MOST_DAYS} days at a time. Written a few times a second, so the last second may still be missing.`,
  query: z
    .strictObject({
      from: day.describe("First day."),
      to: day.describe("Last day."),
      environment: z.enum(["sandbox", "production"]).optional(),
      keyId: z.string().regex(/^key_[0-7][0-9a-hjkmnp-tv-z]{25}$/, "Not the id of a key: it begins with key_.").optional().describe("Only this key's."),
    })
    .refine(({ from, to }) => from <= to, { path: ["to"], message: "The last day lies before the first.", params: { code: "days_reversed" } })
    .refine(({ from, to }) => Date.parse(to) - Date.parse(from) < MOST_DAYS * DAY_MS, { path: ["to"], message: `At most ${MOST_DAYS} days at a time.`, params: { code: "too_many_days" } }),
  answer: z.strictObject({
    items: z.array(
      z
        .strictObject({
          day, keyId: z.string().nullable().describe("Null for requests without a valid key."), environment: z.enum(["none", "sandbox", "production"]), operation: z.string(),
          requests: z.int(), refused: z.int().describe("Of them, answered with a status of 400 or more."), items: z.int().describe("Calculations: more than the requests where batches were sent."),
          meanMilliseconds: z.number(), slowestMilliseconds: z.number(),
        })
        .meta({ id: "UsageRow", description: "Requests of a day, of one key, to one operation." }),
    ),
  }),
});
