import { z } from "zod";
import { changePassword } from "@/lib/accounts/changePassword";
import { newPassword } from "@/lib/accounts/fields";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalOperation } from "@/lib/http/portalOperation";

const body = z.strictObject({ currentPassword: z.string().max(200), newPassword });

export const POST = portalOperation({ access: "signed_in", body, status: 204 }, async ({ caller, input }) => {
  await changePassword(caller, input);
  return {};
});
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
