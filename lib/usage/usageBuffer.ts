import { database } from "@/db/connection";
import { log } from "@/lib/runtime/log";
import { processWide } from "@/lib/runtime/processWide";
import { onShutdown } from "@/lib/runtime/shutdown";

/** A request as it is counted; organisation and key are empty where the caller stayed unknown. */
export interface CountedRequest {
  requestId: string;
  organisationId: string;
  keyId: string;
  environment: "none" | "sandbox" | "production";
  operation: string;
  status: number;
  problem: string | null;
  address: string;
  items: number;
  microseconds: number;
  at: number;
}

interface Tally {
  requests: number;
  items: number;
  microseconds: number;
  slowest: number;
}

const FLUSH_MS = 250;
const MINUTE_MS = 60_000;
/** Single requests kept for the Requests page out of each flush; what goes beyond is only counted. */
const RECENT_PER_FLUSH = 20;
const SEPARATOR = "|";

/** Counts every request in memory and writes the sums to the database a few times a second. */
export class UsageBuffer {
  private tallies = new Map<string, Tally>();
  private recent: CountedRequest[] = [];
  private lastUse = new Map<string, { at: number; address: string }>();
  private timer: NodeJS.Timeout | null = null;
  private flushing: Promise<void> | null = null;

  count(request: CountedRequest): void {
    const minute = Math.floor(request.at / MINUTE_MS) * MINUTE_MS;
    const slot = [request.organisationId, minute, request.keyId, request.environment, request.operation, request.status].join(SEPARATOR);
    this.add(slot, { requests: 1, items: request.items, microseconds: request.microseconds, slowest: request.microseconds });
    if (request.organisationId && this.recent.length < RECENT_PER_FLUSH) this.recent.push(request);
    if (request.keyId) this.lastUse.set(request.keyId, { at: request.at, address: request.address });
    this.timer ??= setTimeout(() => void this.flush(), FLUSH_MS).unref();
  }

  /** Writes what was counted. What cannot be written stays and goes with the next flush. */
  async flush(): Promise<void> {
    await this.flushing;
    this.flushing = this.write().finally(() => {
      this.flushing = null;
    });
    return this.flushing;
  }

  private add(slot: string, more: Tally): void {
    const tally = this.tallies.get(slot);
    if (!tally) {
      this.tallies.set(slot, more);
      return;
    }
    tally.requests += more.requests;
    tally.items += more.items;
    tally.microseconds += more.microseconds;
    tally.slowest = Math.max(tally.slowest, more.slowest);
  }

  private async write(): Promise<void> {
    if (this.timer) clearTimeout(this.timer);
    this.timer = null;
    if (this.tallies.size === 0) return;
    const { tallies, recent, lastUse } = this;
    this.tallies = new Map();
    this.recent = [];
    this.lastUse = new Map();
    try {
      await writeTallies(tallies);
    } catch (error) {
      log().warn({ err: error }, "usage could not be written; it is kept for the next flush");
      for (const [slot, tally] of tallies) this.add(slot, tally);
      this.timer ??= setTimeout(() => void this.flush(), FLUSH_MS * 4).unref();
      return;
    }
    await writeRecent(recent, lastUse).catch((error: unknown) => log().warn({ err: error }, "recent requests could not be written"));
  }
}

async function writeTallies(tallies: Map<string, Tally>): Promise<void> {
  // In the order of the primary key, so that two instances take the row locks in the same order.
  const rows = [...tallies]
    .sort(([one], [other]) => (one < other ? -1 : 1))
    .map(([slot, tally]) => {
      const [organisation_id, minute, api_key_id, environment, operation, status] = slot.split(SEPARATOR);
      return {
        organisation_id, minute: new Date(Number(minute)), api_key_id, environment, operation, status: Number(status),
        requests: tally.requests, items: tally.items, microseconds: tally.microseconds, slowest_microseconds: tally.slowest,
      };
    });
  const db = database();
  await db("usage_minutes")
    .insert(rows)
    .onConflict()
    .merge({
      requests: db.raw("requests + VALUES(requests)"),
      items: db.raw("items + VALUES(items)"),
      microseconds: db.raw("microseconds + VALUES(microseconds)"),
      slowest_microseconds: db.raw("GREATEST(slowest_microseconds, VALUES(slowest_microseconds))"),
    });
}

async function writeRecent(recent: CountedRequest[], lastUse: Map<string, { at: number; address: string }>): Promise<void> {
  const db = database();
  if (recent.length > 0) {
    await db("requests").insert(
      recent.map((request) => ({
        id: request.requestId, organisation_id: request.organisationId, api_key_id: request.keyId, environment: request.environment,
        operation: request.operation, status: request.status, problem: request.problem, address: request.address,
        microseconds: request.microseconds, at: new Date(request.at),
      })),
    );
  }
  for (const [keyId, { at, address }] of lastUse) {
    await db("api_keys").where({ id: keyId }).update({ last_used_at: new Date(at), last_used_from: address });
  }
}

export const usageBuffer = (): UsageBuffer =>
  processWide("usageBuffer", () => {
    const buffer = new UsageBuffer();
    database();
    onShutdown("usage", () => buffer.flush());
    return buffer;
  });
