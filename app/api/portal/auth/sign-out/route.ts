import { recordAudit } from "@/lib/accounts/audit";
import { endSession } from "@/lib/accounts/session";
import { clearedSessionCookie } from "@/lib/http/cookies";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalOperation } from "@/lib/http/portalOperation";

/** Also where the session has ended by itself: the cookie goes. */
export const POST = portalOperation({ access: "anyone", status: 204 }, async ({ caller }) => {
  if (caller) {
    await endSession(caller.sessionId);
    await recordAudit({ action: "sign_out", organisationId: caller.organisation?.id, actorUserId: caller.userId, subject: caller.userId });
  }
  return { cookie: clearedSessionCookie() };
});
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
