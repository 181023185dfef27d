import { z } from "zod";
import { emailAddress } from "@/lib/accounts/fields";
import { askForReset } from "@/lib/accounts/resetPassword";
import { portalOperation } from "@/lib/http/portalOperation";
import { log } from "@/lib/runtime/log";

const body = z.strictObject({ email: emailAddress });

export const POST = portalOperation({ access: "anyone", body, status: 202 }, async ({ input }) => {
  // Not waited for: how long the answer takes must not tell whether the address has an account.
  void askForReset(input.email).catch((error: unknown) => log().error({ err: error }, "a reset link could not be sent"));
  return {};
});
