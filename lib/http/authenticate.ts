import ipaddr from "ipaddr.js";
import type { Scope } from "@/api-spec/define";
import type { ProblemSlug } from "@/api-spec/problems";
import { callerAddress } from "@/lib/runtime/caller";
import { type Problem, refusal } from "@/lib/problems/problem";
import { keyDirectory, type Key } from "@/lib/keys/keyDirectory";
import { parseKeyText, sameSecret } from "@/lib/keys/keyText";

const CHALLENGE = 'Bearer realm="averduct"';

const refuse = (slug: ProblemSlug, detail: string, error?: "invalid_token" | "insufficient_scope"): Problem =>
  refusal(slug, detail, { header: "Authorization" }, { "WWW-Authenticate": error ? `${CHALLENGE}, error="${error}"` : CHALLENGE });

/** The key a request carries, whatever it may be used for. Throws the problem that says what is wrong with it. */
export async function identifyKey(request: Request): Promise<Key> {
  const header = request.headers.get("authorization");
  if (header === null) throw refuse("missing-key", "Send your API key as: Authorization: Bearer averduct_…");
  const [scheme, text, ...rest] = header.trim().split(/\s+/);
  if (scheme?.toLowerCase() !== "bearer" || text === undefined || rest.length > 0) {
    throw refuse("missing-key", "The Authorization header must be the word Bearer, one space, and the key.");
  }
  const parsed = parseKeyText(text);
  if (!parsed) throw refuse("malformed-key", "The key's form or checksum is wrong, so a character was lost or changed in copying.", "invalid_token");

  const found = keyDirectory().find(parsed.id);
  const key = found instanceof Promise ? await found : found;
  if (!key || key.environment !== parsed.environment || !sameSecret(key.secretHash, parsed.secretHash)) {
    throw refuse("unknown-key", "There is no such key on record.", "invalid_token");
  }
  return key;
}

/** Throws the problem that keeps this key from an operation that needs `scope`, if there is one. */
export function authorise(key: Key, scope: Scope, now: number): void {
  if (key.revokedAt !== null && key.revokedAt <= now) {
    throw refuse("revoked-key", `The key was revoked at ${new Date(key.revokedAt).toISOString()}.`, "invalid_token");
  }
  if (key.expiresAt !== null && key.expiresAt <= now) {
    throw refuse("expired-key", `The key expired at ${new Date(key.expiresAt).toISOString()}.`, "invalid_token");
  }
  if (key.organisationSuspended) throw refuse("account-suspended", "The organisation that owns this key is suspended.");
  if (key.networks && !isWithin(key.networks, callerAddress())) {
    throw refuse("network-not-allowed", `The request came from ${callerAddress() ?? "an unknown address"}, which is in none of the key's allowed networks.`);
  }
  if (!key.scopes.has(scope)) {
    throw refuse("insufficient-scope", `This operation needs the scope "${scope}"; the key has: ${[...key.scopes].join(", ") || "none"}.`, "insufficient_scope");
  }
}

function isWithin(networks: NonNullable<Key["networks"]>, address: string | null): boolean {
  if (address === null || !ipaddr.isValid(address)) return false;
  const parsed = ipaddr.process(address);
  return networks.some(([network, bits]) => network.kind() === parsed.kind() && parsed.match(network, bits));
}
