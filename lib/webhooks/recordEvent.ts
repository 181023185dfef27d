import type { Knex } from "knex";
import type { EventType } from "@/api-spec/records/events";
import { newId } from "@/lib/ids/newId";
import { addRecord, type Realm } from "@/lib/records/realm";

/**
 * Writes what happened in the transaction of the change itself, so that neither is there without the other.
 * A worker tells the endpoints afterwards.
 */
export async function recordEvent(db: Knex, realm: Realm, type: EventType, data: object): Promise<void> {
  await addRecord(db, "events", realm, { id: newId("evt"), type, data: JSON.stringify(data), at: new Date() });
}
