import { z } from "zod";
import { defineOperation } from "../define";
import { moment, page, pageQuery, recordId } from "./common";

const TAG = "Events and webhooks";

export const eventType = z.enum(["traverse.issued", "traverse.voided", "instrument.calibration_due", "quota.reached"]).meta({
  id: "EventType",
  description:
    "`traverse.issued` and `traverse.voided`: a record was signed, or withdrawn. `instrument.calibration_due`: an instrument's calibration is due within 14 days or has lapsed; told once for each due date. `quota.reached`: the month's requests are used up; told once a month.",
});
export type EventType = z.output<typeof eventType>;

export const eventId = recordId("evt", "an event");

export const eventAnswer = z
  .strictObject({
    id: eventId.describe("Id of the event; the `webhook-id` of its deliveries."),
    type: eventType,
    timestamp: moment.describe("When it happened."),
    data: z.record(z.string(), z.unknown()).describe("What it happened to: the ids and the figures that a program needs to decide whether to read the record."),
  })
  .meta({ id: "Event", description: "Something that happened to a record." });

export const eventsQuery = z.strictObject({ ...pageQuery, type: eventType.optional() });

export const listEvents = defineOperation({
  id: "listEvents", method: "get", path: "/events", tag: TAG, scope: "webhooks",
  summary: "List events",
  description: "What happened in the key's environment within the last 90 days, the latest first, whether an endpoint was told or not. A program that was away can catch up here.",
  query: eventsQuery,
  answer: page(eventAnswer),
});

export const readEvent = defineOperation({
  id: "readEvent", method: "get", path: "/events/{id}", tag: TAG, scope: "webhooks",
  summary: "Read an event",
  description: "One event.",
  params: z.strictObject({ id: eventId }),
  answer: eventAnswer,
  problems: ["not-found"],
});
