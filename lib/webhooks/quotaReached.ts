import { database } from "@/db/connection";
import { recordsOf, type Realm } from "@/lib/records/realm";
import { processWide } from "@/lib/runtime/processWide";
import { recordEvent } from "./recordEvent";

const told = (): Map<string, number> => processWide("quotaReachedTold", () => new Map<string, number>());

/**
 * Writes the event that a realm's requests of this month are used up, once a month.
 * The process remembers what it has told, so that further refused requests cost no query.
 */
export async function recordQuotaReached(realm: Realm, now = Date.now()): Promise<void> {
  const date = new Date(now);
  const monthStart = Date.UTC(date.getUTCFullYear(), date.getUTCMonth(), 1);
  const subject = `${realm.organisationId}:${realm.environment}`;
  if (told().get(subject) === monthStart) return;
  told().set(subject, monthStart);
  await write(realm, monthStart).catch((error: unknown) => {
    told().delete(subject);
    throw error;
  });
}

const write = (realm: Realm, monthStart: number): Promise<void> =>
  database().transaction(async (db) => {
    // One at a time in an organisation, so that two instances do not both find nothing.
    await db("organisations").where("id", realm.organisationId).forUpdate().first("id");
    const before = await recordsOf<{ id: string }>(db, "events", realm).where("events.type", "quota.reached").where("events.at", ">=", new Date(monthStart)).first("events.id");
    if (!before) await recordEvent(db, realm, "quota.reached", { month: new Date(monthStart).toISOString().slice(0, 7) });
  }, { isolationLevel: "read committed" });
