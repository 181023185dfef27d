import ipaddr from "ipaddr.js";
import type { Knex } from "knex";
import type { Scope } from "@/api-spec/define";
import { database } from "@/db/connection";
import { processWide } from "@/lib/runtime/processWide";
import { log } from "@/lib/runtime/log";
import { onShutdown } from "@/lib/runtime/shutdown";
import type { Environment } from "./keyText";

/** What the request path has to know of a key. */
export interface Key {
  id: string;
  organisationId: string;
  environment: Environment;
  secretHash: Buffer;
  scopes: ReadonlySet<Scope>;
  /** Networks the key may be used from; null: from everywhere. */
  networks: [ipaddr.IPv4 | ipaddr.IPv6, number][] | null;
  expiresAt: number | null;
  revokedAt: number | null;
  organisationSuspended: boolean;
  requestsPerSecond: number;
  monthlyRequests: number;
}

interface KeyRow {
  id: string;
  organisation_id: string;
  environment: Environment;
  secret_hash: Buffer;
  scopes: Scope[];
  allowed_networks: string[] | null;
  expires_at: Date | null;
  revoked_at: Date | null;
  suspended_at: Date | null;
  requests_per_second: number;
  monthly_requests: number;
}

/** A change made anywhere, a revocation above all, holds here after one round at the latest. */
const REFRESH_MS = 2_000;
const FORGET_AFTER_MS = 10 * 60_000;
const MOST_KEYS = 5_000;
/** An id that is on no record is not asked for again at once, so that guessing cannot load the database. */
const UNKNOWN_FOR_MS = 2_000;

interface Entry {
  key: Key | null;
  usedAt: number;
  loadedAt: number;
}

const keyRows = (db: Knex): Knex.QueryBuilder<KeyRow, KeyRow[]> =>
  db("api_keys as k")
    .join("organisations as o", "o.id", "k.organisation_id")
    .join("plans as p", "p.id", "o.plan_id")
    .select<KeyRow[]>(
      "k.id", "k.organisation_id", "k.environment", "k.secret_hash", "k.scopes", "k.allowed_networks", "k.expires_at", "k.revoked_at",
      "o.suspended_at", "p.requests_per_second", "p.monthly_requests",
    );

function toKey(row: KeyRow): Key {
  return {
    id: row.id,
    organisationId: row.organisation_id,
    environment: row.environment,
    secretHash: row.secret_hash,
    scopes: new Set(row.scopes),
    networks: row.allowed_networks && row.allowed_networks.map((network) => ipaddr.parseCIDR(network)),
    expiresAt: row.expires_at?.getTime() ?? null,
    revokedAt: row.revoked_at?.getTime() ?? null,
    organisationSuspended: row.suspended_at !== null,
    requestsPerSecond: row.requests_per_second,
    monthlyRequests: row.monthly_requests,
  };
}

/**
 * The keys in use, held in memory and refreshed from the database in the background: a known key costs a request
 * no wait, a revocation holds within seconds, and a database that is away does not stop a known key.
 */
export class KeyDirectory {
  private readonly entries = new Map<string, Entry>();
  private readonly loading = new Map<string, Promise<Key | null>>();
  private readonly timer: NodeJS.Timeout;

  constructor() {
    this.timer = setInterval(() => void this.refresh().catch((error: unknown) => log().warn({ err: error }, "keys could not be refreshed")), REFRESH_MS);
    this.timer.unref();
    onShutdown("key directory", async () => clearInterval(this.timer));
  }

  /** The key with this id; null when there is none. Waits for the database only the first time. */
  find(id: string): Key | null | Promise<Key | null> {
    const now = Date.now();
    const entry = this.entries.get(id);
    if (entry && (entry.key !== null || now - entry.loadedAt < UNKNOWN_FOR_MS)) {
      entry.usedAt = now;
      return entry.key;
    }
    return this.load(id);
  }

  private load(id: string): Promise<Key | null> {
    const running = this.loading.get(id);
    if (running) return running;
    const loading = (async () => {
      const row = await keyRows(database()).where("k.id", id).first<KeyRow | undefined>();
      const key = row ? toKey(row) : null;
      this.makeRoom();
      this.entries.set(id, { key, usedAt: Date.now(), loadedAt: Date.now() });
      return key;
    })().finally(() => this.loading.delete(id));
    this.loading.set(id, loading);
    return loading;
  }

  private makeRoom(): void {
    // A Map keeps the order of insertion, so the first is the one that has been here longest.
    const oldest = this.entries.keys().next();
    if (this.entries.size >= MOST_KEYS && !oldest.done) this.entries.delete(oldest.value);
  }

  private async refresh(): Promise<void> {
    const now = Date.now();
    for (const [id, entry] of this.entries) {
      const idle = now - entry.usedAt > FORGET_AFTER_MS || (entry.key === null && now - entry.loadedAt > UNKNOWN_FOR_MS);
      if (idle) this.entries.delete(id);
    }
    const known = [...this.entries].filter(([, entry]) => entry.key !== null).map(([id]) => id);
    if (known.length === 0) return;
    const rows = new Map((await keyRows(database()).whereIn("k.id", known)).map((row) => [row.id, row]));
    for (const id of known) {
      const row = rows.get(id);
      const entry = this.entries.get(id);
      if (entry) Object.assign(entry, { key: row ? toKey(row) : null, loadedAt: Date.now() });
    }
  }
}

export const keyDirectory = (): KeyDirectory => processWide("keyDirectory", () => new KeyDirectory());
