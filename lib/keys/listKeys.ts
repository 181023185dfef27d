import type { Knex } from "knex";
import type { Scope } from "@/api-spec/define";
import { database } from "@/db/connection";
import type { Environment } from "./keyText";

export type KeyStatus = "active" | "expired" | "revoked";

/** A key as its organisation sees it; never its secret. */
export interface KeySummary {
  id: string;
  name: string;
  environment: Environment;
  scopes: Scope[];
  /** The last characters of its text. */
  ending: string;
  allowedNetworks: string[] | null;
  expiresAt: Date | null;
  revokedAt: Date | null;
  replacedBy: string | null;
  createdAt: Date;
  /** Name of who made it; null where that is not known. */
  createdBy: string | null;
  lastUsedAt: Date | null;
  lastUsedFrom: string | null;
  status: KeyStatus;
}

interface Row {
  id: string;
  name: string;
  environment: Environment;
  scopes: Scope[];
  ending: string;
  allowed_networks: string[] | null;
  expires_at: Date | null;
  revoked_at: Date | null;
  replaced_by: string | null;
  created_at: Date;
  creator: string | null;
  last_used_at: Date | null;
  last_used_from: string | null;
}

const keysOf = (organisationId: string): Knex.QueryBuilder =>
  database()("api_keys as k").leftJoin("users as u", "u.id", "k.created_by").where("k.organisation_id", organisationId).select("k.*", "u.name as creator");

function toSummary(row: Row): KeySummary {
  const now = new Date();
  const status = row.revoked_at ? "revoked" : row.expires_at && row.expires_at <= now ? "expired" : "active";
  return {
    id: row.id, name: row.name, environment: row.environment, scopes: row.scopes, ending: row.ending, allowedNetworks: row.allowed_networks,
    expiresAt: row.expires_at, revokedAt: row.revoked_at, replacedBy: row.replaced_by, createdAt: row.created_at, createdBy: row.creator,
    lastUsedAt: row.last_used_at, lastUsedFrom: row.last_used_from, status,
  };
}

/** Every key of an organisation, the newest first. */
export async function listKeys(organisationId: string): Promise<KeySummary[]> {
  const rows: Row[] = await keysOf(organisationId).orderBy("k.id", "desc");
  return rows.map(toSummary);
}

/** One key of an organisation; null when it has none with this id. */
export async function findKeySummary(organisationId: string, id: string): Promise<KeySummary | null> {
  const row: Row | undefined = await keysOf(organisationId).where("k.id", id).first();
  return row ? toSummary(row) : null;
}
