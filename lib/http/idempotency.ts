import { createHash } from "node:crypto";
import type { Knex } from "knex";
import { addRecord, recordsOf, type Realm } from "@/lib/records/realm";
import { refusal } from "@/lib/problems/problem";
import { open, seal } from "@/lib/runtime/secretBox";

const LONGEST = 200;

/** An answer as it can be kept and given again. */
export interface KeptAnswer {
  status: number;
  headers: Record<string, string>;
  text: string;
}

/** The Idempotency-Key of a request: bare, or in quotes as draft-ietf-httpapi-idempotency-key-header has it. */
export function idempotencyKeyOf(request: Request): string | null {
  const given = request.headers.get("idempotency-key")?.trim();
  if (given === undefined) return null;
  const key = /^"(.*)"$/.exec(given)?.[1] ?? given;
  if (key.length > 0 && key.length <= LONGEST) return key;
  throw refusal("invalid-request", `An Idempotency-Key has 1 to ${LONGEST} characters; a UUID does well.`, { header: "Idempotency-Key", code: "idempotency_key_length" });
}

/** What makes two requests the same. */
export const fingerprintOf = (method: string, path: string, input: unknown): Buffer => createHash("sha256").update(JSON.stringify([method, path, input ?? null])).digest();

/**
 * Takes an Idempotency-Key for the transaction's work, or gives the answer that was given before.
 * A request with the same key that is still running is waited for: the row is locked until its transaction ends.
 */
export async function claimIdempotencyKey(db: Knex, realm: Realm, key: string, fingerprint: Buffer): Promise<KeptAnswer | null> {
  try {
    await addRecord(db, "idempotency_keys", realm, { idempotency_key: key, fingerprint, created_at: new Date() });
    return null;
  } catch (error) {
    if ((error as { code?: string }).code !== "ER_DUP_ENTRY") throw error;
  }
  const kept = await recordsOf<{ fingerprint: Buffer; status: number; headers: Record<string, string>; answer: string }>(db, "idempotency_keys", realm).where("idempotency_key", key).first();
  if (!kept) throw new Error("an idempotency key that was there is gone");
  if (kept.fingerprint.equals(fingerprint)) return { status: kept.status, headers: { ...kept.headers, "Idempotency-Replayed": "true" }, text: open(kept.answer) };
  throw refusal("idempotency-key-reused", "This Idempotency-Key was used for another request within the last 24 hours.", { header: "Idempotency-Key" });
}

/** Keeps the answer with the work it belongs to, so that either both are there or neither. Sealed: an answer may hold a secret that is shown once. */
export async function keepAnswer(db: Knex, realm: Realm, key: string, { status, headers, text }: KeptAnswer): Promise<void> {
  await recordsOf(db, "idempotency_keys", realm).where("idempotency_key", key).update({ status, headers: JSON.stringify(headers), answer: seal(text) });
}
