import { database } from "@/db/connection";
import { recordAudit } from "./audit";
import { redeemEmailToken } from "./emailToken";
import { createSession, type Visit } from "./session";

/** Takes note that an e-mail address is the person's own, and signs in whoever could open the link. */
export async function verifyEmail(token: string, visit: Visit): Promise<string> {
  const verified = await database().transaction(async (db) => {
    const userId = await redeemEmailToken(token, "verify_email", db);
    await db("users").where({ id: userId }).update({ email_verified_at: new Date() });
    await recordAudit({ action: "email_verified", actorUserId: userId, subject: userId }, db);
    return userId;
  });
  return createSession(verified, visit);
}
