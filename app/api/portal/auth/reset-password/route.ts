import { z } from "zod";
import { newPassword } from "@/lib/accounts/fields";
import { resetPassword } from "@/lib/accounts/resetPassword";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalOperation } from "@/lib/http/portalOperation";

const body = z.strictObject({ token: z.string().max(100), password: newPassword });

export const POST = portalOperation({ access: "anyone", body }, async ({ input }) => {
  await resetPassword(input);
  return {};
});
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
