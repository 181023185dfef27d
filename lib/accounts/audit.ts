import type { Knex } from "knex";
import { database } from "@/db/connection";
import { newId } from "@/lib/ids/newId";
import { callerAddress } from "@/lib/runtime/caller";

export interface AuditEntry {
  action:
    | "sign_up" | "sign_in" | "sign_in_refused" | "sign_out" | "email_verified" | "password_reset_asked" | "password_reset"
    | "password_changed" | "session_ended"
    | "key_created" | "key_rotated" | "key_revoked";
  organisationId?: string | null;
  actorUserId?: string | null;
  /** What was acted upon: an id or an e-mail address. */
  subject: string;
  details?: Record<string, unknown>;
}

/** Writes down who did what to whom, from where. */
export async function recordAudit({ action, organisationId, actorUserId, subject, details }: AuditEntry, db: Knex = database()): Promise<void> {
  await db("audit_log").insert({
    id: newId("aud"),
    organisation_id: organisationId ?? null,
    actor_user_id: actorUserId ?? null,
    action,
    subject: subject.slice(0, 120),
    details: details ? JSON.stringify(details) : null,
    address: callerAddress(),
  });
}
