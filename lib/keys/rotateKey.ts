import { database } from "@/db/connection";
import { recordAudit } from "@/lib/accounts/audit";
import { refusal } from "@/lib/problems/problem";
import { createKey } from "./createKey";
import { findKeyOrThrow } from "./findKeyOrThrow";

const HOUR_MS = 3_600_000;

/**
 * Makes a successor with the same settings and lets both work for the overlap, so that nothing stops while the new key
 * is put in place. The old key then expires by itself.
 */
export async function rotateKey(organisationId: string, id: string, overlapHours: number, by: string): Promise<{ id: string; text: string }> {
  const old = await findKeyOrThrow(organisationId, id);
  if (old.status !== "active" || old.replacedBy) {
    throw refusal("invalid-request", old.replacedBy ? "This key has a successor already; rotate that one." : `This key is ${old.status}; make a new one instead.`, { code: "key_not_active" });
  }
  const endsAt = new Date(Date.now() + overlapHours * HOUR_MS);
  return database().transaction(async (db) => {
    const { name, environment, scopes, allowedNetworks, expiresAt } = old;
    const successor = await createKey({ organisationId, name, environment, scopes, allowedNetworks, expiresAt, createdBy: by }, db);
    await db("api_keys")
      .where({ id, organisation_id: organisationId })
      .update({ replaced_by: successor.id, expires_at: expiresAt && expiresAt < endsAt ? expiresAt : endsAt });
    await recordAudit({ action: "key_rotated", organisationId, actorUserId: by, subject: id, details: { successor: successor.id, overlapHours } }, db);
    return successor;
  });
}
