import { database } from "@/db/connection";
import { usageRows, type UsageFilter } from "./usageQuery";

/** Requests of each day by key and operation, the first day first. */
export async function usageByDayAndKey(filter: UsageFilter) {
  const db = database();
  const rows: Record<string, string>[] = await usageRows(filter)
    .select(db.raw("DATE_FORMAT(minute, '%Y-%m-%d') AS day"), "api_key_id", "usage_minutes.environment", "operation")
    .sum({ requests: "requests", refused: db.raw("IF(status >= 400, requests, 0)"), items: "items", microseconds: "microseconds" })
    .max({ slowest: "slowest_microseconds" })
    .groupBy("day", "api_key_id", "usage_minutes.environment", "operation")
    .orderBy(["day", "api_key_id", "operation"]);
  return rows.map((row) => ({
    day: row.day!,
    keyId: row.api_key_id || null,
    environment: row.environment as "none" | "sandbox" | "production",
    operation: row.operation!,
    requests: Number(row.requests),
    refused: Number(row.refused),
    items: Number(row.items),
    meanMilliseconds: Number(row.microseconds) / Math.max(1, Number(row.requests)) / 1_000,
    slowestMilliseconds: Number(row.slowest) / 1_000,
  }));
}
