import { z } from "zod";
import { signUp } from "@/lib/accounts/signUp";
import { emailAddress, newPassword, personName } from "@/lib/accounts/fields";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalOperation } from "@/lib/http/portalOperation";

const body = z.strictObject({ email: emailAddress, name: personName, organisation: personName, password: newPassword });

export const POST = portalOperation({ access: "anyone", body, status: 201 }, async ({ input }) => {
  await signUp(input);
  return {};
});
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
