import { database } from "@/db/connection";
import { Problem } from "@/lib/problems/problem";
import { recordAudit } from "./audit";
import type { SignedIn } from "./session";

/** Ends one of somebody's own sessions. Throws the problem where they have none with this id. */
export async function endOwnSession({ userId, organisation }: SignedIn, id: string): Promise<void> {
  const ended = await database()("sessions").where({ id, user_id: userId }).delete();
  if (ended === 0) throw new Problem("not-found", { detail: "You have no session with this id.", errors: [{ pointer: "", parameter: "id", code: "not_found", detail: "You have no session with this id." }] });
  await recordAudit({ action: "session_ended", organisationId: organisation?.id, actorUserId: userId, subject: id });
}
