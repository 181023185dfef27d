import type { Knex } from "knex";
import type { z } from "zod";
import type { webhookEndpointAnswer, webhookEndpointChange, webhookEndpointFields } from "@/api-spec/records/webhookEndpoints";
import type { EventType } from "@/api-spec/records/events";
import { newId } from "@/lib/ids/newId";
import { Problem, refusal } from "@/lib/problems/problem";
import type { RecordContext } from "@/lib/records/context";
import { noSuchRecord } from "@/lib/records/noSuchRecord";
import { pageOf, type Page, type PageRequest } from "@/lib/records/page";
import { addRecord, recordsOf } from "@/lib/records/realm";
import { seal } from "@/lib/runtime/secretBox";
import { disableEndpoint } from "./disableEndpoint";
import { newSecret } from "./signature";
import { checkTarget, ForbiddenTarget, targetPolicy } from "./targets";

export type WebhookEndpoint = z.output<typeof webhookEndpointAnswer>;
type Reading = Pick<RecordContext, "db" | "realm">;

const MOST_ENDPOINTS = 20;
const OVERLAP_MS = 24 * 3_600_000;

export interface EndpointRow {
  id: string;
  version: number;
  url: string;
  description: string | null;
  event_types: EventType[];
  secret_encrypted: string;
  previous_secret_encrypted: string | null;
  previous_secret_until: Date | null;
  failing_since: Date | null;
  disabled_at: Date | null;
  disabled_reason: string | null;
  created_at: Date;
  updated_at: Date;
}

export const endpointOf = (row: EndpointRow): WebhookEndpoint => ({
  id: row.id, url: row.url, description: row.description, eventTypes: row.event_types,
  enabled: row.disabled_at === null, disabledAt: row.disabled_at?.toISOString() ?? null, disabledReason: row.disabled_reason,
  failingSince: row.failing_since?.toISOString() ?? null, createdAt: row.created_at.toISOString(), updatedAt: row.updated_at.toISOString(),
});

export const endpoints = ({ db, realm }: Reading) => recordsOf<EndpointRow>(db, "webhook_endpoints", realm);

/** The row of an endpoint. Throws the problem where there is none. */
export async function findEndpoint(context: Reading, id: string, lock = false): Promise<EndpointRow> {
  const query = endpoints(context).where("webhook_endpoints.id", id);
  const row = await (lock ? query.forUpdate() : query).first();
  if (!row) throw noSuchRecord("webhook endpoint");
  return row;
}

/** Makes an endpoint. Gives its secret too, which is not to be had again. */
export async function createEndpoint(context: RecordContext, { url, eventTypes, description }: z.output<typeof webhookEndpointFields>): Promise<{ row: EndpointRow; secret: string }> {
  refuseForbidden(url);
  await refuseTooMany(context);
  const id = newId("whe");
  const secret = newSecret();
  const now = new Date();
  await addRecord(context.db, "webhook_endpoints", context.realm, {
    id, url, description: description ?? null, event_types: JSON.stringify(eventTypes), secret_encrypted: seal(secret), created_at: now, updated_at: now,
  });
  return { row: await findEndpoint(context, id), secret };
}

export async function listEndpoints(context: Reading, page: PageRequest): Promise<Page<WebhookEndpoint>> {
  const { items, next } = await pageOf(endpoints(context), "webhook_endpoints", { column: "webhook_endpoints.id", direction: "desc", valueOf: ({ id }: EndpointRow) => id }, page);
  return { items: items.map(endpointOf), next };
}

/** Changes what is sent. @param requireMatch Throws unless the version is the one the caller saw. */
export async function changeEndpoint(context: RecordContext, id: string, { url, description, eventTypes, enabled }: z.output<typeof webhookEndpointChange>, requireMatch: (version: number) => void): Promise<EndpointRow> {
  const row = await findEndpoint(context, id, true);
  requireMatch(row.version);
  if (url !== undefined) refuseForbidden(url);
  // A new address, or a new beginning, has not failed yet.
  const afresh = (url !== undefined && url !== row.url) || enabled === true;
  await update(context, row, {
    ...(url !== undefined && { url }),
    ...(description !== undefined && { description }),
    ...(eventTypes !== undefined && { event_types: JSON.stringify(eventTypes) }),
    ...(afresh && { failing_since: null }),
    ...(enabled === true && { disabled_at: null, disabled_reason: null }),
  });
  if (enabled === false && row.disabled_at === null) await disableEndpoint(context.db, context.realm, id, "Disabled by the organisation.");
  return findEndpoint(context, id);
}

export async function deleteEndpoint(context: RecordContext, id: string, requireMatch: (version: number) => void): Promise<void> {
  requireMatch((await findEndpoint(context, id, true)).version);
  await endpoints(context).where("webhook_endpoints.id", id).delete();
}

/** Gives an endpoint a new secret; the one before signs as well for a day. */
export async function rotateSecret(context: RecordContext, id: string): Promise<{ secret: string; previousSecretUntil: string }> {
  const row = await findEndpoint(context, id, true);
  const secret = newSecret();
  const until = new Date(Date.now() + OVERLAP_MS);
  await update(context, row, { secret_encrypted: seal(secret), previous_secret_encrypted: row.secret_encrypted, previous_secret_until: until });
  return { secret, previousSecretUntil: until.toISOString() };
}

const update = (context: RecordContext, { id, version }: EndpointRow, columns: Record<string, Knex.Value>): Promise<number> =>
  endpoints(context).where("webhook_endpoints.id", id).update({ ...columns, version: version + 1, updated_at: new Date() } as never);

function refuseForbidden(url: string): void {
  try {
    checkTarget(url, targetPolicy());
  } catch (error) {
    if (!(error instanceof ForbiddenTarget)) throw error;
    throw new Problem("invalid-request", { detail: `At /url: ${error.message}`, errors: [{ pointer: "/url", code: "forbidden_target", detail: error.message }] });
  }
}

async function refuseTooMany(context: RecordContext): Promise<void> {
  // One at a time in an organisation, so that two at once do not both find room.
  await context.db("organisations").where("id", context.realm.organisationId).forUpdate().first("id");
  const rows = await endpoints(context).select("webhook_endpoints.id");
  if (rows.length < MOST_ENDPOINTS) return;
  throw refusal("too-many-endpoints", `There are ${rows.length} webhook endpoints in this environment already.`);
}
