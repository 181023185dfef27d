import { z } from "zod";
import { emailAddress } from "@/lib/accounts/fields";
import { askForReset } from "@/lib/accounts/resetPassword";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalOperation } from "@/lib/http/portalOperation";

const body = z.strictObject({ email: emailAddress });

export const POST = portalOperation({ access: "anyone", body, status: 202 }, async ({ input }) => {
  await askForReset(input.email);
  return {};
});
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
