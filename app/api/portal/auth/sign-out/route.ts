import { recordAudit } from "@/lib/accounts/audit";
import { endSession } from "@/lib/accounts/session";
import { clearedSessionCookie } from "@/lib/http/cookies";
import { portalOperation } from "@/lib/http/portalOperation";

export const POST = portalOperation({ access: "signed_in", status: 204 }, async ({ caller }) => {
  await endSession(caller.sessionId);
  await recordAudit({ action: "sign_out", actorUserId: caller.userId, subject: caller.userId });
  return { cookie: clearedSessionCookie() };
});
