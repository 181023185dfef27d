import type { Knex } from "knex";
import { database } from "@/db/connection";
import { newId } from "@/lib/ids/newId";
import { callerAddress } from "@/lib/runtime/caller";
import { hashToken, makeSecretToken } from "./secretToken";

export const SESSION_COOKIE = "averduct_session";

export type Role = "owner" | "developer" | "viewer";

/** Somebody signed in, and the organisation they work for. */
export interface SignedIn {
  userId: string;
  email: string;
  name: string;
  isAdministrator: boolean;
  emailVerified: boolean;
  sessionId: string;
  /** Null for platform administrators who belong to none. */
  organisation: { id: string; name: string; role: Role; planId: string; suspendedAt: Date | null } | null;
}

export const SESSION_DAYS = 14;
const DAY_MS = 86_400_000;
const IDLE_MS = 3 * DAY_MS;
const SEEN_EVERY_MS = 60_000;
const LONGEST_TOKEN = 100;

/** Who begins a session: from which program, and in place of which session it showed. */
export interface Visit {
  userAgent: string;
  formerSessionId?: string;
}

/** Begins a session and returns the token for the cookie. The session it takes the place of ends. */
export async function createSession(userId: string, { userAgent, formerSessionId }: Visit): Promise<string> {
  const { token, hash } = makeSecretToken();
  await database()("sessions").insert({
    id: newId("ses"),
    token_hash: hash,
    user_id: userId,
    address: callerAddress() ?? "",
    user_agent: userAgent.slice(0, 300),
    expires_at: new Date(Date.now() + SESSION_DAYS * DAY_MS),
  });
  if (formerSessionId) await endSession(formerSessionId);
  return token;
}

export const endSession = async (sessionId: string): Promise<void> => {
  await database()("sessions").where({ id: sessionId }).delete();
};

/** Ends all of a person's sessions, but for one they may keep. */
export async function endSessionsOf(userId: string, keepSessionId?: string, db: Knex = database()): Promise<void> {
  await db("sessions").where({ user_id: userId }).whereNot("id", keepSessionId ?? "").delete();
}

interface SessionRow {
  session_id: string;
  last_seen_at: Date;
  user_id: string;
  email: string;
  name: string;
  is_administrator: number;
  email_verified_at: Date | null;
  organisation_id: string | null;
  organisation_name: string;
  role: Role;
  plan_id: string;
  suspended_at: Date | null;
}

/** Narrows a query on `sessions as s` to those that have neither expired nor been idle for too long. */
export const aliveSessions = (query: Knex.QueryBuilder, now: number): Knex.QueryBuilder =>
  query.where("s.expires_at", ">", new Date(now)).where("s.last_seen_at", ">", new Date(now - IDLE_MS));

/** Who a session's token belongs to; null when it is unknown, expired or idle for too long. */
export async function findSignedIn(token: string | undefined): Promise<SignedIn | null> {
  if (!token || token.length > LONGEST_TOKEN) return null;
  const now = Date.now();
  const row = await aliveSessions(database()("sessions as s"), now)
    .join("users as u", "u.id", "s.user_id")
    .leftJoin("memberships as m", "m.user_id", "u.id")
    .leftJoin("organisations as o", "o.id", "m.organisation_id")
    .where("s.token_hash", hashToken(token))
    .orderBy("m.created_at")
    .first<SessionRow | undefined>(
      "s.id as session_id", "s.last_seen_at", "u.id as user_id", "u.email", "u.name", "u.is_administrator", "u.email_verified_at",
      "o.id as organisation_id", "o.name as organisation_name", "m.role", "o.plan_id", "o.suspended_at",
    );
  if (!row) return null;
  if (now - row.last_seen_at.getTime() > SEEN_EVERY_MS) await database()("sessions").where({ id: row.session_id }).update({ last_seen_at: new Date(now) });
  return toSignedIn(row);
}

const toSignedIn = (row: SessionRow): SignedIn => ({
  userId: row.user_id,
  email: row.email,
  name: row.name,
  isAdministrator: Boolean(row.is_administrator),
  emailVerified: row.email_verified_at !== null,
  sessionId: row.session_id,
  organisation: row.organisation_id
    ? { id: row.organisation_id, name: row.organisation_name, role: row.role, planId: row.plan_id, suspendedAt: row.suspended_at }
    : null,
});
