import { spend } from "@/lib/accounts/allowance";
import { sendVerification } from "@/lib/accounts/signUp";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalOperation } from "@/lib/http/portalOperation";

export const POST = portalOperation({ access: "signed_in", status: 202 }, async ({ caller }) => {
  if (!caller.emailVerified) {
    await spend("mail", caller.email);
    await sendVerification(caller.userId, caller.email);
  }
  return {};
});
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
