import { requireVerifiedEmail } from "@/lib/accounts/requireVerifiedEmail";
import { portalOperation } from "@/lib/http/portalOperation";
import { createKey } from "@/lib/keys/createKey";

const HOUR_MS = 3_600_000;

/** A short-lived sandbox key for trying operations on the reference page. */
export const POST = portalOperation({ access: "developer", status: 201 }, async ({ caller }) => {
  requireVerifiedEmail(caller);
  const { text } = await createKey({
    organisationId: caller.organisation.id,
    createdBy: caller.userId,
    name: "API reference",
    environment: "sandbox",
    scopes: ["calculations"],
    expiresAt: new Date(Date.now() + HOUR_MS),
    allowedNetworks: null,
  });
  return { body: { text } };
});
