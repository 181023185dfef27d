import { database } from "@/db/connection";
import { usageRows, type UsageFilter } from "./usageQuery";

const HEADER = "day,key,environment,operation,status,requests,calculations,mean_microseconds,slowest_microseconds";

/** A cell that no spreadsheet takes for a formula, quoted where it has to be. */
export function csvCell(value: string | number): string {
  const text = String(value);
  const harmless = /^[=+\-@\t\r]/.test(text) && typeof value !== "number" ? `'${text}` : text;
  return /[",\r\n]/.test(harmless) ? `"${harmless.replaceAll('"', '""')}"` : harmless;
}

/** Usage as CSV: a row for each day, key, operation and status. */
export async function usageCsv(filter: UsageFilter): Promise<string> {
  const db = database();
  const rows: Record<string, string>[] = await usageRows(filter)
    .leftJoin("api_keys as k", "k.id", "usage_minutes.api_key_id")
    .select(db.raw("DATE_FORMAT(minute, '%Y-%m-%d') AS day"), "k.name as key_name", "usage_minutes.environment", "operation", "status")
    .sum({ requests: "requests", items: "items", microseconds: "microseconds" })
    .max({ slowest: "slowest_microseconds" })
    .groupBy("day", "api_key_id", "usage_minutes.environment", "operation", "status")
    .orderBy("day");
  const lines = rows.map((row) => {
    const requests = Number(row.requests);
    const mean = Math.round(Number(row.microseconds) / Math.max(1, requests));
    return [row.day!, row.key_name ?? "", row.environment!, row.operation!, Number(row.status), requests, Number(row.items), mean, Number(row.slowest)].map(csvCell).join(",");
  });
  return [HEADER, ...lines, ""].join("\r\n");
}
