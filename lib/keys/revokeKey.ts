import { database } from "@/db/connection";
import { recordAudit } from "@/lib/accounts/audit";
import { findKeyOrThrow } from "./findKeyOrThrow";

/** Revokes a key for good; it stops everywhere within seconds. Revoking it again changes nothing. */
export async function revokeKey(organisationId: string, id: string, by: string): Promise<void> {
  await findKeyOrThrow(organisationId, id);
  const changed = await database()("api_keys").where({ id, organisation_id: organisationId, revoked_at: null }).update({ revoked_at: new Date() });
  if (changed > 0) await recordAudit({ action: "key_revoked", organisationId, actorUserId: by, subject: id });
}
