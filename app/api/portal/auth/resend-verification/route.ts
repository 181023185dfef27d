import { sendVerification } from "@/lib/accounts/signUp";
import { portalOperation } from "@/lib/http/portalOperation";

export const POST = portalOperation({ access: "signed_in", status: 202 }, async ({ caller }) => {
  if (!caller.emailVerified) await sendVerification(caller.userId, caller.email);
  return {};
});
