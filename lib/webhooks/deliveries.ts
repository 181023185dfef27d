import type { z } from "zod";
import type { deliveryAnswer } from "@/api-spec/records/webhookEndpoints";
import { refusal } from "@/lib/problems/problem";
import type { RecordContext } from "@/lib/records/context";
import { noSuchRecord } from "@/lib/records/noSuchRecord";
import { pageOf, type Page, type PageRequest } from "@/lib/records/page";
import { recordsOf } from "@/lib/records/realm";
import { findEndpoint } from "./endpoints";
import { addDelivery } from "./queue";

export type Delivery = z.output<typeof deliveryAnswer>;
type Reading = Pick<RecordContext, "db" | "realm">;

interface DeliveryRow {
  id: string;
  event_id: string;
  type: Delivery["eventType"];
  status: Delivery["status"];
  next_attempt_at: Date | null;
  created_at: Date;
  delivered_at: Date | null;
}

interface AttemptRow {
  delivery_id: string;
  at: Date;
  status: number | null;
  error: string | null;
  milliseconds: number;
}

const deliveriesTo = ({ db, realm }: Reading, endpointId: string) =>
  recordsOf<DeliveryRow>(db, "deliveries", realm).where("deliveries.webhook_endpoint_id", endpointId).join("events", "events.id", "deliveries.event_id")
    .select("deliveries.id", "deliveries.event_id", "events.type", "deliveries.status", "deliveries.next_attempt_at", "deliveries.created_at", "deliveries.delivered_at");

/** Rows of deliveries with their attempts. */
async function withAttempts({ db }: Reading, rows: DeliveryRow[]): Promise<Delivery[]> {
  const attempts = await db<AttemptRow>("delivery_attempts").whereIn("delivery_id", rows.map(({ id }) => id)).orderBy(["delivery_id", "number"]);
  return rows.map(({ id, event_id, type, status, next_attempt_at, created_at, delivered_at }) => ({
    id, eventId: event_id, eventType: type, status,
    attempts: attempts.filter(({ delivery_id }) => delivery_id === id).map(({ at, status, error, milliseconds }) => ({ at: at.toISOString(), status, error, milliseconds })),
    nextAttemptAt: next_attempt_at?.toISOString() ?? null, createdAt: created_at.toISOString(), deliveredAt: delivered_at?.toISOString() ?? null,
  }));
}

/** The log of what was sent to an endpoint, the latest first. */
export async function listDeliveries(context: Reading, endpointId: string, page: PageRequest): Promise<Page<Delivery>> {
  await findEndpoint(context, endpointId);
  const { items, next } = await pageOf(deliveriesTo(context, endpointId) as never, "deliveries", { column: "deliveries.id", direction: "desc", valueOf: ({ id }: DeliveryRow) => id }, page);
  return { items: await withAttempts(context, items as DeliveryRow[]), next };
}

async function findDelivery(context: Reading, endpointId: string, id: string): Promise<DeliveryRow> {
  const row = await deliveriesTo(context, endpointId).where("deliveries.id", id).first();
  if (!row) throw noSuchRecord("delivery");
  return row as DeliveryRow;
}

/** Makes a new delivery of the same event to the same endpoint. It takes the place of one that still waits. */
export async function redeliver(context: RecordContext, endpointId: string, id: string): Promise<Delivery> {
  const endpoint = await findEndpoint(context, endpointId, true);
  const { event_id: eventId } = await findDelivery(context, endpointId, id);
  if (endpoint.disabled_at !== null) {
    throw refusal("endpoint-disabled", `The endpoint is disabled: ${endpoint.disabled_reason}`);
  }
  await recordsOf(context.db, "deliveries", context.realm).where({ webhook_endpoint_id: endpointId, event_id: eventId, status: "pending" }).update({ status: "failed", next_attempt_at: null } as never);
  const added = await addDelivery(context.db, context.realm, eventId, endpointId);
  return (await withAttempts(context, [await findDelivery(context, endpointId, added)]))[0]!;
}
