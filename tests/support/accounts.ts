import knex, { type Knex } from "knex";
import { knexConfig } from "@/knexfile";
import type { Scope } from "@/api-spec/define";
import { newId } from "@/lib/ids/newId";
import { makeKeyText, type Environment } from "@/lib/keys/keyText";

let pool: Knex | null = null;

/** The test database, for arranging and for looking; the application is spoken to through HTTP only. */
export const testDatabase = (): Knex => (pool ??= knex(knexConfig(process.env.DATABASE_URL!, 4)));

/** Makes an organisation on a plan of its own, so that limits of one test do not touch another. */
export async function makeOrganisation(limits: { requestsPerSecond?: number; monthlyRequests?: number } = {}): Promise<string> {
  const id = newId("org");
  const planId = id.slice(0, 32);
  await testDatabase()("plans").insert({
    id: planId,
    name: "Test",
    requests_per_second: limits.requestsPerSecond ?? 10_000,
    monthly_requests: limits.monthlyRequests ?? 10_000_000,
  });
  await testDatabase()("organisations").insert({ id, name: "Slateboard Software", plan_id: planId });
  return id;
}

interface KeySettings {
  organisationId?: string;
  environment?: Environment;
  scopes?: Scope[];
  expiresAt?: Date;
  revokedAt?: Date;
  allowedNetworks?: string[];
}

/** Makes a key straight in the database and returns its text. */
export async function makeKey(settings: KeySettings = {}): Promise<{ id: string; text: string; organisationId: string }> {
  const organisationId = settings.organisationId ?? (await makeOrganisation());
  const key = makeKeyText(settings.environment ?? "sandbox");
  await testDatabase()("api_keys").insert({
    id: key.id,
    organisation_id: organisationId,
    environment: key.environment,
    name: "test",
    secret_hash: key.secretHash,
    ending: key.text.slice(-4),
    scopes: JSON.stringify(settings.scopes ?? ["calculations"]),
    allowed_networks: settings.allowedNetworks ? JSON.stringify(settings.allowedNetworks) : null,
    expires_at: settings.expiresAt ?? null,
    revoked_at: settings.revokedAt ?? null,
  });
  return { id: key.id, text: key.text, organisationId };
}
