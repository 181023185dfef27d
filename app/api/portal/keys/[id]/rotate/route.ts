import { z } from "zod";
import { requireVerifiedEmail } from "@/lib/accounts/requireVerifiedEmail";
import { portalOperation } from "@/lib/http/portalOperation";
import { rotateKey } from "@/lib/keys/rotateKey";

const params = z.strictObject({ id: z.string().max(40) });
const body = z.strictObject({ overlapHours: z.number().min(0).max(720) });

export const POST = portalOperation({ access: "developer", body, params, status: 201 }, async ({ caller, input, params: { id } }) => {
  requireVerifiedEmail(caller);
  return { body: await rotateKey(caller.organisation.id, id, input.overlapHours, caller.userId) };
});
