import { z } from "zod";
import { SCOPES, type Scope } from "@/api-spec/define";
import { personName } from "@/lib/accounts/fields";
import { requireVerifiedEmail } from "@/lib/accounts/requireVerifiedEmail";
import { portalOperation } from "@/lib/http/portalOperation";
import { createKey } from "@/lib/keys/createKey";
import { listKeys } from "@/lib/keys/listKeys";

const DAY_MS = 86_400_000;

const body = z.strictObject({
  name: personName.pipe(z.string().max(80)),
  environment: z.enum(["sandbox", "production"]),
  scopes: z.array(z.enum(Object.keys(SCOPES) as [Scope, ...Scope[]])).min(1),
  expiresInDays: z.number().min(1).max(3650).nullish(),
  allowedNetworks: z.array(z.string().trim().max(60)).max(50).nullish(),
});

export const GET = portalOperation({ access: "viewer" }, async ({ caller }) => ({ body: { items: await listKeys(caller.organisation.id) } }));

export const POST = portalOperation({ access: "developer", body, status: 201 }, async ({ caller, input }) => {
  requireVerifiedEmail(caller);
  const { name, environment, expiresInDays, allowedNetworks } = input;
  return {
    body: await createKey({
      organisationId: caller.organisation.id,
      createdBy: caller.userId,
      name,
      environment,
      scopes: [...new Set(input.scopes)],
      expiresAt: expiresInDays ? new Date(Date.now() + expiresInDays * DAY_MS) : null,
      allowedNetworks: allowedNetworks ?? null,
    }),
  };
});
