import type { Knex } from "knex";
import { recordsOf } from "@/lib/records/realm";
import { disableEndpoint } from "./disableEndpoint";
import type { EndpointRow } from "./endpoints";
import type { Outcome } from "./post";
import { secondsFromNow, type TakenDelivery } from "./queue";
import { PATIENCE_S, pauseAfter } from "./schedule";

const GONE = 410;
const succeeded = ({ status }: Outcome): boolean => status !== null && status >= 200 && status < 300;

/**
 * Writes down what came of an attempt, and what follows. In the caller's transaction; the endpoint is locked before its
 * deliveries, as everywhere.
 * @returns Why the endpoint was disabled, where it was.
 */
export async function settle(db: Knex, delivery: TakenDelivery, outcome: Outcome): Promise<string | null> {
  const { realm, id, attempt, endpointId } = delivery;
  const endpoint = await recordsOf<EndpointRow>(db, "webhook_endpoints", realm).where("webhook_endpoints.id", endpointId).forUpdate().first();
  const row = endpoint && (await recordsOf<{ status: string; attempts: number }>(db, "deliveries", realm).where("deliveries.id", id).forUpdate().first());
  // Deleted while it was under way.
  if (!endpoint || !row) return null;
  await db("delivery_attempts").insert({ delivery_id: id, number: attempt, at: new Date(Date.now() - outcome.milliseconds), ...outcome });
  if (succeeded(outcome)) {
    await change(db, delivery, { status: "delivered", delivered_at: new Date(), next_attempt_at: null });
    if (endpoint.failing_since !== null) await setFailingSince(db, delivery, null);
    return null;
  }
  // Given up in the meantime, or taken again by another worker after the lease: what follows is not this worker's to say.
  if (row.status !== "pending" || row.attempts !== attempt) return null;
  return afterFailure(db, delivery, endpoint, outcome);
}

async function afterFailure(db: Knex, delivery: TakenDelivery, endpoint: EndpointRow, { status }: Outcome): Promise<string | null> {
  const pause = status === GONE ? null : pauseAfter(delivery.attempt);
  await change(db, delivery, pause === null ? { status: "failed", next_attempt_at: null } : { next_attempt_at: secondsFromNow(db, pause) });
  const since = endpoint.failing_since ?? new Date();
  if (endpoint.failing_since === null) await setFailingSince(db, delivery, since);
  const reason =
    status === GONE ? "It answered 410 Gone, which asks not to be sent anything more."
    : Date.now() - since.getTime() >= PATIENCE_S * 1_000 ? "Every delivery to it has failed for three days."
    : null;
  if (reason !== null) await disableEndpoint(db, delivery.realm, endpoint.id, reason);
  return reason;
}

const change = (db: Knex, { realm, id }: TakenDelivery, columns: Record<string, unknown>): Promise<number> =>
  recordsOf(db, "deliveries", realm).where("deliveries.id", id).update(columns as never);

/** The endpoint shows it, so its version goes on. */
const setFailingSince = (db: Knex, { realm, endpointId }: TakenDelivery, since: Date | null): Promise<number> =>
  recordsOf(db, "webhook_endpoints", realm).where("webhook_endpoints.id", endpointId).update({ failing_since: since, version: db.raw("version + 1") } as never);
