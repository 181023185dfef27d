import { z } from "zod";
import { endOwnSession } from "@/lib/accounts/endOwnSession";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalOperation } from "@/lib/http/portalOperation";

const params = z.strictObject({ id: z.string().max(40) });

export const POST = portalOperation({ access: "signed_in", params, status: 204 }, async ({ caller, params: { id } }) => {
  await endOwnSession(caller, id);
  return {};
});
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
