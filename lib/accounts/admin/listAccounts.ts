import { database } from "@/db/connection";
import { firstOfMonth } from "@/lib/usage/usageQuery";

export interface AccountSummary {
  id: string;
  name: string;
  plan: string;
  monthlyRequests: number;
  members: number;
  keys: number;
  sandbox: number;
  production: number;
  refused: number;
  lastRequestAt: Date | null;
  suspendedAt: Date | null;
  createdAt: Date;
}

type UsageRow = Record<"organisation_id" | "sandbox" | "production" | "refused", string>;

/** Every account with its usage of the current month, in three queries however many there are. */
export async function listAccounts(): Promise<AccountSummary[]> {
  const db = database();
  const [organisations, usage, lastRequests] = await Promise.all([
    db("organisations as o")
      .join("plans as p", "p.id", "o.plan_id")
      .select("o.id", "o.name", "o.suspended_at", "o.created_at", "p.name as plan", "p.monthly_requests")
      .select(db("memberships").count("*").whereRaw("organisation_id = o.id").as("members"))
      .select(db("api_keys").count("*").whereRaw("organisation_id = o.id").whereNull("revoked_at").as("active_keys")),
    db("usage_minutes")
      .where("minute", ">=", new Date(`${firstOfMonth()}T00:00:00Z`))
      .whereNot("organisation_id", "")
      .groupBy("organisation_id")
      .select("organisation_id")
      .sum({ sandbox: db.raw("IF(environment = 'sandbox', requests, 0)"), production: db.raw("IF(environment = 'production', requests, 0)"), refused: db.raw("IF(status >= 400, requests, 0)") }),
    db("api_keys").groupBy("organisation_id").select("organisation_id").max({ at: "last_used_at" }),
  ]);
  const usageOf = new Map((usage as unknown as UsageRow[]).map((row) => [row.organisation_id, row]));
  const lastOf = new Map((lastRequests as unknown as { organisation_id: string; at: Date | null }[]).map((row) => [row.organisation_id, row.at]));
  return organisations.map((row) => ({
    id: row.id,
    name: row.name,
    plan: row.plan,
    monthlyRequests: row.monthly_requests,
    members: Number(row.members),
    keys: Number(row.active_keys),
    sandbox: Number(usageOf.get(row.id)?.sandbox ?? 0),
    production: Number(usageOf.get(row.id)?.production ?? 0),
    refused: Number(usageOf.get(row.id)?.refused ?? 0),
    lastRequestAt: lastOf.get(row.id) ?? null,
    suspendedAt: row.suspended_at,
    createdAt: row.created_at,
  }));
}
