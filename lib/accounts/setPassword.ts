import type { Knex } from "knex";
import { endSessionsOf } from "./session";

/** Stores a new password and ends what the old one may have opened: sessions, but for one to keep, and links sent before. */
export async function setPassword(userId: string, passwordHash: string, db: Knex, keepSessionId?: string): Promise<void> {
  await db("users").where({ id: userId }).update({ password_hash: passwordHash });
  await db("email_tokens").where({ user_id: userId, used_at: null }).delete();
  await endSessionsOf(userId, keepSessionId, db);
}
