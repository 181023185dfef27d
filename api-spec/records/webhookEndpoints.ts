import { z } from "zod";
import { defineOperation } from "../define";
import { line, moment, page, pageQuery, recordId, times } from "./common";
import { eventId, eventType } from "./events";

const TAG = "Events and webhooks";

export const webhookEndpointId = recordId("whe", "a webhook endpoint");
export const deliveryId = recordId("dlv", "a delivery");
const params = z.strictObject({ id: webhookEndpointId });

const url = z
  .url({ protocol: /^https?$/, error: "Must be an absolute URL with https." })
  .max(500)
  .describe("Where events are posted. It must use https and resolve to public addresses; only a local installation also takes http and private addresses.");

const eventTypes = z
  .array(eventType)
  .min(1)
  .refine((types) => new Set(types).size === types.length, { error: "Each type is named once.", params: { code: "repeated" } })
  .describe("The types of event it is told of.");

const secret = z.string().describe("Signs every delivery (Standard Webhooks): `whsec_` and the key in base64. Shown this once.");

export const webhookEndpointAnswer = z
  .strictObject({
    id: webhookEndpointId,
    url: z.string(),
    description: z.string().nullable(),
    eventTypes: z.array(eventType),
    enabled: z.boolean(),
    disabledAt: moment.nullable(),
    disabledReason: z.string().nullable(),
    failingSince: moment.nullable().describe("Since when every delivery to it has failed; null while they arrive."),
    ...times,
  })
  .meta({ id: "WebhookEndpoint", description: "An address that is told of events." });

export const newWebhookEndpointAnswer = webhookEndpointAnswer.extend({ secret }).meta({ id: "NewWebhookEndpoint", description: "An endpoint just made, with its secret." });

const description = line(200).nullish().describe("What it is for.");

export const webhookEndpointFields = z.strictObject({ url, eventTypes, description }).meta({ id: "WebhookEndpointFields", description: "An endpoint to be made." });
export const webhookEndpointChange = z
  .strictObject({ url, eventTypes, description, enabled: z.boolean().describe("`false`: no more deliveries, and those waiting are given up. `true`: again from the next event on.") })
  .partial()
  .meta({ id: "WebhookEndpointChange", description: "What is to change of an endpoint." });

export const createWebhookEndpoint = defineOperation({
  id: "createWebhookEndpoint", method: "post", path: "/webhook-endpoints", tag: TAG, scope: "webhooks", status: 201, versioned: true,
  summary: "Make a webhook endpoint",
  description:
    "From now on, events of the chosen types are posted to the URL as `{ \"type\", \"timestamp\", \"data\" }`, signed as Standard Webhooks has it: the header `webhook-signature` holds `v1,` and the base64 HMAC-SHA256 of `webhook-id`, `webhook-timestamp` and the body, joined by dots. Answer with any 2xx within 10 seconds; anything else is tried again with growing pauses for three days. The same event can arrive more than once: its `webhook-id` stays the same. At most 20 endpoints an environment.",
  body: webhookEndpointFields,
  answer: newWebhookEndpointAnswer,
  problems: ["too-many-endpoints"],
});

export const listWebhookEndpoints = defineOperation({
  id: "listWebhookEndpoints", method: "get", path: "/webhook-endpoints", tag: TAG, scope: "webhooks",
  summary: "List webhook endpoints",
  description: "The endpoints of the key's environment, the latest first.",
  query: z.strictObject(pageQuery),
  answer: page(webhookEndpointAnswer),
});

export const readWebhookEndpoint = defineOperation({
  id: "readWebhookEndpoint", method: "get", path: "/webhook-endpoints/{id}", tag: TAG, scope: "webhooks", versioned: true,
  summary: "Read a webhook endpoint",
  description: "One endpoint, without its secret.",
  params,
  answer: webhookEndpointAnswer,
  problems: ["not-found"],
});

export const changeWebhookEndpoint = defineOperation({
  id: "changeWebhookEndpoint", method: "patch", path: "/webhook-endpoints/{id}", tag: TAG, scope: "webhooks", versioned: true,
  summary: "Change a webhook endpoint",
  description: "Changes the fields that are sent. An endpoint that was disabled, because it failed for three days or answered 410, is enabled again with `\"enabled\": true`.",
  params,
  body: webhookEndpointChange,
  answer: webhookEndpointAnswer,
  problems: ["not-found", "precondition-failed"],
});

export const deleteWebhookEndpoint = defineOperation({
  id: "deleteWebhookEndpoint", method: "delete", path: "/webhook-endpoints/{id}", tag: TAG, scope: "webhooks", status: 204, versioned: true,
  summary: "Delete a webhook endpoint",
  description: "Deletes an endpoint with its secret and its deliveries. The events stay.",
  params,
  answer: z.null(),
  problems: ["not-found", "precondition-failed"],
});

export const rotateWebhookSecret = defineOperation({
  id: "rotateWebhookSecret", method: "post", path: "/webhook-endpoints/{id}/secret", tag: TAG, scope: "webhooks", status: 201,
  summary: "Replace a webhook endpoint's secret",
  description: "Makes a new secret. For 24 hours deliveries carry two signatures, one with each secret, so that a receiver can change over at any time within them.",
  params,
  answer: z.strictObject({ secret, previousSecretUntil: moment.describe("Until when the secret before it signs as well.") }).meta({ id: "NewWebhookSecret", description: "An endpoint's new secret." }),
  problems: ["not-found"],
});

export const deliveryAnswer = z
  .strictObject({
    id: deliveryId,
    eventId,
    eventType,
    status: z.enum(["pending", "delivered", "failed"]),
    attempts: z
      .array(
        z.strictObject({
          at: moment,
          status: z.int().nullable().describe("HTTP status of the answer; null where there was none."),
          error: z.string().nullable().describe("Why there was no answer, or why it does not count."),
          milliseconds: z.int(),
        }),
      )
      .describe("Every attempt, the first first."),
    nextAttemptAt: moment.nullable().describe("While pending: when it is tried next, or again should the attempt under way come to nothing."),
    createdAt: moment,
    deliveredAt: moment.nullable(),
  })
  .meta({ id: "Delivery", description: "One event's way to one endpoint." });

export const listDeliveries = defineOperation({
  id: "listDeliveries", method: "get", path: "/webhook-endpoints/{id}/deliveries", tag: TAG, scope: "webhooks",
  summary: "List an endpoint's deliveries",
  description: "The log of what was sent to an endpoint, with every attempt, the latest first.",
  params,
  query: z.strictObject(pageQuery),
  answer: page(deliveryAnswer),
  problems: ["not-found"],
});

export const redeliver = defineOperation({
  id: "redeliver", method: "post", path: "/webhook-endpoints/{id}/deliveries/{deliveryId}/redeliver", tag: TAG, scope: "webhooks", status: 202,
  summary: "Deliver an event again",
  description: "Makes a new delivery of the same event to the same endpoint, due at once, with retries of its own. If the old one is still waiting for a retry, the new one takes its place.",
  params: z.strictObject({ id: webhookEndpointId, deliveryId }),
  answer: deliveryAnswer,
  problems: ["not-found", "endpoint-disabled"],
});
