import type { Knex } from "knex";
import { database } from "@/db/connection";
import { newId } from "@/lib/ids/newId";
import { Problem } from "@/lib/problems/problem";
import { hashToken, makeSecretToken } from "./secretToken";

export type EmailPurpose = "verify_email" | "reset_password";

const HOUR_MS = 3_600_000;
const VALID_MS: Record<EmailPurpose, number> = { verify_email: 72 * HOUR_MS, reset_password: 1 * HOUR_MS };

/** Makes a link's token for a purpose; an earlier one for the same purpose is no longer good. */
export async function createEmailToken(userId: string, purpose: EmailPurpose, db: Knex = database()): Promise<string> {
  const { token, hash } = makeSecretToken();
  await db("email_tokens").where({ user_id: userId, purpose, used_at: null }).delete();
  await db("email_tokens").insert({ id: newId("emt"), user_id: userId, purpose, token_hash: hash, expires_at: new Date(Date.now() + VALID_MS[purpose]) });
  return token;
}

const goodTokens = (db: Knex, token: string, purpose: EmailPurpose): Knex.QueryBuilder =>
  db("email_tokens").where({ token_hash: hashToken(token), purpose, used_at: null }).where("expires_at", ">", new Date());

/** Whose a token is, without using it up. Throws the problem when it is unknown, used or expired. */
export async function ownerOfEmailToken(token: string, purpose: EmailPurpose, db: Knex = database()): Promise<string> {
  const row = await goodTokens(db, token, purpose).first<{ user_id: string } | undefined>("user_id");
  if (!row) throw linkNotValid();
  return row.user_id;
}

/** Uses a token up. Throws the problem when it is unknown, used or expired, or used by somebody else meanwhile. */
export async function redeemEmailToken(token: string, purpose: EmailPurpose, db: Knex): Promise<string> {
  const userId = await ownerOfEmailToken(token, purpose, db);
  const used = await goodTokens(db, token, purpose).update({ used_at: new Date() });
  if (used !== 1) throw linkNotValid();
  return userId;
}

function linkNotValid(): Problem {
  const detail = "This link is not valid: it was used already, it has expired, or a newer one was sent. Ask for a new one.";
  return new Problem("link-not-valid", { detail, errors: [{ pointer: "/token", code: "link_not_valid", detail }] });
}
