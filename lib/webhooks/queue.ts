import type { Knex } from "knex";
import { newId } from "@/lib/ids/newId";
import { addRecord, type Realm } from "@/lib/records/realm";
import type { EventType } from "@/api-spec/records/events";

/**
 * What workers take from the database. They serve every realm, so these are the only queries of records that none
 * bounds; what they write carries the realm of what it was made from. Waiting and leases go by the database's clock,
 * which all instances share.
 */

/** How long a worker that took a delivery has it to itself: well over what an attempt can last. */
const LEASE_S = 60;
const EVENTS_AT_ONCE = 100;

interface RealmColumns {
  organisation_id: string;
  environment: Realm["environment"];
}

const realmOf = ({ organisation_id, environment }: RealmColumns): Realm => ({ organisationId: organisation_id, environment });

export const secondsFromNow = (db: Knex, seconds: number): Knex.Raw => db.raw("TIMESTAMPADD(MICROSECOND, ?, NOW(3))", [Math.round(seconds * 1e6)]);

interface UndispatchedEvent extends RealmColumns {
  id: string;
  type: EventType;
}

/** Makes a delivery of each new event for each endpoint that wants it. Gives how many events it took. */
export async function dispatchEvents(db: Knex): Promise<number> {
  return db.transaction(async (transaction) => {
    const events = await transaction<UndispatchedEvent>("events").whereNull("dispatched_at").orderBy("id").limit(EVENTS_AT_ONCE).forUpdate().skipLocked().select("id", "type", "organisation_id", "environment");
    if (events.length === 0) return 0;
    const endpoints = await transaction<RealmColumns & { id: string; event_types: EventType[] }>("webhook_endpoints")
      .whereIn("organisation_id", [...new Set(events.map(({ organisation_id }) => organisation_id))])
      .whereNull("disabled_at")
      // Whoever disables one waits, and then gives up the deliveries made here too.
      .forShare()
      .select("id", "organisation_id", "environment", "event_types");
    for (const event of events) {
      const wanting = endpoints.filter((one) => one.organisation_id === event.organisation_id && one.environment === event.environment && one.event_types.includes(event.type));
      for (const endpoint of wanting) await addDelivery(transaction, realmOf(event), event.id, endpoint.id);
    }
    await transaction("events").whereIn("id", events.map(({ id }) => id)).update({ dispatched_at: new Date() });
    return events.length;
  }, { isolationLevel: "read committed" });
}

/** Adds a delivery that is due at once. Gives its id. */
export async function addDelivery(db: Knex, realm: Realm, eventId: string, endpointId: string): Promise<string> {
  const id = newId("dlv");
  await addRecord(db, "deliveries", realm, { id, event_id: eventId, webhook_endpoint_id: endpointId, next_attempt_at: db.fn.now(3), created_at: new Date() });
  return id;
}

export interface DueEndpoint {
  id: string;
  failing: boolean;
}

/**
 * The endpoints that something is due to, the longest waiting first.
 * @param except Those that are not asked for.
 * @param most How many at the most.
 */
export async function dueEndpoints(db: Knex, except: string[], most: number): Promise<DueEndpoint[]> {
  // For each endpoint one look at the head of its queue, however long that is.
  const due = db("deliveries as d").where("d.status", "pending").whereRaw("d.webhook_endpoint_id = e.id").orderBy("d.next_attempt_at").limit(1).select("d.next_attempt_at").as("due_at");
  const rows = await db("webhook_endpoints as e")
    .whereNull("e.disabled_at")
    .whereNotIn("e.id", except)
    .having("due_at", "<=", db.fn.now(3))
    .orderBy("due_at")
    .limit(most)
    .select<{ id: string; failing_since: Date | null }[]>("e.id", "e.failing_since", due);
  return rows.map(({ id, failing_since }) => ({ id, failing: failing_since !== null }));
}

export interface TakenDelivery {
  id: string;
  realm: Realm;
  endpointId: string;
  /** This attempt's number. A worker that held a delivery beyond its lease finds a higher one, and leaves it alone. */
  attempt: number;
  url: string;
  secretEncrypted: string;
  previousSecretEncrypted: string | null;
  previousSecretUntil: Date | null;
  event: { id: string; type: EventType; data: Record<string, unknown>; at: Date };
}

interface TakenRow extends RealmColumns {
  id: string;
  webhook_endpoint_id: string;
  attempts: number;
  url: string;
  secret_encrypted: string;
  previous_secret_encrypted: string | null;
  previous_secret_until: Date | null;
  event_id: string;
  type: EventType;
  data: Record<string, unknown>;
  at: Date;
}

/** Takes deliveries due to an endpoint, so that no other worker does. One that is never settled is due again after its lease. */
export async function takeDeliveries(db: Knex, endpointId: string, most: number): Promise<TakenDelivery[]> {
  return db.transaction(async (transaction) => {
    const ids: string[] = await transaction("deliveries")
      .where({ status: "pending", webhook_endpoint_id: endpointId })
      .where("next_attempt_at", "<=", transaction.fn.now(3))
      .orderBy("next_attempt_at")
      .limit(most)
      .forUpdate()
      .skipLocked()
      .pluck("id");
    if (ids.length === 0) return [];
    await transaction("deliveries").whereIn("id", ids).update({ next_attempt_at: secondsFromNow(transaction, LEASE_S), attempts: transaction.raw("attempts + 1") });
    const rows = await transaction("deliveries as d")
      .join("webhook_endpoints as e", "e.id", "d.webhook_endpoint_id")
      .join("events as v", "v.id", "d.event_id")
      .whereIn("d.id", ids)
      .select<TakenRow[]>(
        "d.id", "d.organisation_id", "d.environment", "d.webhook_endpoint_id", "d.attempts", "d.event_id",
        "e.url", "e.secret_encrypted", "e.previous_secret_encrypted", "e.previous_secret_until", "v.type", "v.data", "v.at",
      );
    return rows.map(takenOf);
  }, { isolationLevel: "read committed" });
}

const takenOf = (row: TakenRow): TakenDelivery => ({
  id: row.id,
  realm: realmOf(row),
  endpointId: row.webhook_endpoint_id,
  attempt: row.attempts,
  url: row.url,
  secretEncrypted: row.secret_encrypted,
  previousSecretEncrypted: row.previous_secret_encrypted,
  previousSecretUntil: row.previous_secret_until,
  event: { id: row.event_id, type: row.type, data: row.data, at: row.at },
});
