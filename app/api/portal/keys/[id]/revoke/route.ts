import { z } from "zod";
import { portalOperation } from "@/lib/http/portalOperation";
import { revokeKey } from "@/lib/keys/revokeKey";

const params = z.strictObject({ id: z.string().max(40) });

export const POST = portalOperation({ access: "developer", params }, async ({ caller, params: { id } }) => {
  await revokeKey(caller.organisation.id, id, caller.userId);
  return {};
});
