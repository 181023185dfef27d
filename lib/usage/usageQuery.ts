import type { Knex } from "knex";
import { database } from "@/db/connection";
import type { Environment } from "@/lib/keys/keyText";

const DAY_MS = 86_400_000;

/** Which usage is asked for: days in UTC, both included; everything else narrows it. */
export interface UsageFilter {
  organisationId: string;
  /** First day, as 2026-12-01. */
  from: string;
  /** Last day. */
  to: string;
  environment?: Environment;
  keyId?: string;
}

/** Rows of usage that fit, straight from the primary key's range. Every reading of usage begins here. */
export function usageRows({ organisationId, from, to, environment, keyId }: UsageFilter): Knex.QueryBuilder {
  const rows = database()("usage_minutes")
    .where("usage_minutes.organisation_id", organisationId)
    .where("minute", ">=", new Date(`${from}T00:00:00Z`))
    .where("minute", "<", dayAfter(to));
  if (environment) rows.where("usage_minutes.environment", environment);
  if (keyId) rows.where("api_key_id", keyId);
  return rows;
}

export const dayAfter = (day: string): Date => new Date(new Date(`${day}T00:00:00Z`).getTime() + DAY_MS);

/** Today in UTC, or the day so many days ago, as 2026-12-01. */
export const dayAgo = (days: number): string => new Date(Date.now() - days * DAY_MS).toISOString().slice(0, 10);

/** First day of the current month in UTC. */
export const firstOfMonth = (): string => `${new Date().toISOString().slice(0, 7)}-01`;

/** Every day of a range, in order. */
export function daysBetween(from: string, to: string): string[] {
  const days: string[] = [];
  for (let day = from; day <= to; day = dayAfter(day).toISOString().slice(0, 10)) days.push(day);
  return days;
}
