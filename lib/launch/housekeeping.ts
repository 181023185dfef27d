import { database } from "@/db/connection";
import { log } from "@/lib/runtime/log";
import { sweepObjects } from "@/lib/records/attachments/objects";
import { onShutdown } from "@/lib/runtime/shutdown";
import { calibrationDueEvents } from "@/lib/webhooks/calibrationDue";

const HOUR_MS = 3_600_000;
const DAY_MS = 24 * HOUR_MS;
/** Small steps, so that no other query waits long for a lock. */
const ROWS_AT_ONCE = 1_000;

/** What is kept for a while only, and since when. */
const OUTDATED = [
  { table: "requests", column: "at", afterMs: 7 * DAY_MS },
  { table: "idempotency_keys", column: "created_at", afterMs: DAY_MS },
  { table: "sessions", column: "expires_at", afterMs: 0 },
  { table: "email_tokens", column: "expires_at", afterMs: 7 * DAY_MS },
  // With their deliveries.
  { table: "events", column: "at", afterMs: 90 * DAY_MS },
] as const;

/** Deletes what is outdated, once. Several instances may do so at the same time. */
export async function deleteOutdated(now: number): Promise<void> {
  for (const { table, column, afterMs } of OUTDATED) {
    let deleted = ROWS_AT_ONCE;
    while (deleted === ROWS_AT_ONCE) deleted = await database()(table).where(column, "<", new Date(now - afterMs)).limit(ROWS_AT_ONCE).delete();
  }
}

/** Deletes what is outdated, sweeps up files and tells of calibrations that are due, every hour, for as long as the process runs. */
export function startHousekeeping(): void {
  const timer = setInterval(() => {
    void deleteOutdated(Date.now()).catch((error: unknown) => log().warn({ err: error }, "outdated rows could not be deleted"));
    void calibrationDueEvents().catch((error: unknown) => log().warn({ err: error }, "calibrations that are due could not be told of"));
    void sweepObjects(Date.now()).catch((error: unknown) => log().warn({ err: error }, "files that nothing refers to could not be swept up"));
  }, HOUR_MS).unref();
  onShutdown("housekeeping", async () => clearInterval(timer));
}
