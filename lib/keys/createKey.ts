import ipaddr from "ipaddr.js";
import type { Knex } from "knex";
import type { Scope } from "@/api-spec/define";
import { database } from "@/db/connection";
import { recordAudit } from "@/lib/accounts/audit";
import { Problem } from "@/lib/problems/problem";
import { makeKeyText, type Environment } from "./keyText";

export interface KeySettings {
  organisationId: string;
  environment: Environment;
  name: string;
  scopes: Scope[];
  expiresAt: Date | null;
  /** Networks as CIDR, e.g. 203.0.113.0/24; null: from everywhere. */
  allowedNetworks: string[] | null;
  /** The person who makes it; null from the command line. */
  createdBy: string | null;
}

/** Makes a key. Its text is returned this once; only its hash is kept. */
export async function createKey(settings: KeySettings, db: Knex = database()): Promise<{ id: string; text: string }> {
  requireNetworks(settings.allowedNetworks);
  const { id, text, secretHash } = makeKeyText(settings.environment);
  await db("api_keys").insert({
    id,
    organisation_id: settings.organisationId,
    environment: settings.environment,
    name: settings.name,
    secret_hash: secretHash,
    ending: text.slice(-4),
    scopes: JSON.stringify(settings.scopes),
    allowed_networks: settings.allowedNetworks?.length ? JSON.stringify(settings.allowedNetworks) : null,
    expires_at: settings.expiresAt,
    created_by: settings.createdBy,
  });
  await recordAudit({ action: "key_created", organisationId: settings.organisationId, actorUserId: settings.createdBy, subject: id, details: { name: settings.name, environment: settings.environment } }, db);
  return { id, text };
}

function requireNetworks(networks: string[] | null): void {
  const errors = (networks ?? []).flatMap((network, index) => {
    if (ipaddr.isValidCIDR(network)) return [];
    return [{ pointer: `/allowedNetworks/${index}`, code: "network_not_valid", detail: `"${network}" is not a network in CIDR form, such as 203.0.113.0/24 or 2001:db8::/32.` }];
  });
  const [first] = errors;
  if (first) throw new Problem("invalid-request", { detail: first.detail, errors });
}
