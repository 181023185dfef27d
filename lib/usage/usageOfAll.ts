import { database } from "@/db/connection";
import { dayAfter, daysBetween } from "./usageQuery";

/** Requests over all accounts by day, with those of nobody (no or an unknown key) apart. */
export async function usageOfAllByDay(from: string, to: string): Promise<{ day: string; answered: number; refused: number; unknown: number }[]> {
  const db = database();
  const rows: Record<string, string>[] = await db("usage_minutes")
    .where("minute", ">=", new Date(`${from}T00:00:00Z`))
    .where("minute", "<", dayAfter(to))
    .select(db.raw("DATE_FORMAT(minute, '%Y-%m-%d') AS day"))
    .sum({
      answered: db.raw("IF(organisation_id <> '' AND status < 400, requests, 0)"),
      refused: db.raw("IF(organisation_id <> '' AND status >= 400, requests, 0)"),
      unknown: db.raw("IF(organisation_id = '', requests, 0)"),
    })
    .groupBy("day");
  const byDay = new Map(rows.map((row) => [row.day, row]));
  return daysBetween(from, to).map((day) => {
    const row = byDay.get(day);
    return { day, answered: Number(row?.answered ?? 0), refused: Number(row?.refused ?? 0), unknown: Number(row?.unknown ?? 0) };
  });
}

/** Requests over all accounts by operation, the most used first. */
export async function usageOfAllByOperation(from: string, to: string): Promise<{ operation: string; requests: number; refused: number; meanMicroseconds: number }[]> {
  const db = database();
  const rows: Record<string, string>[] = await db("usage_minutes")
    .where("minute", ">=", new Date(`${from}T00:00:00Z`))
    .where("minute", "<", dayAfter(to))
    .groupBy("operation")
    .select("operation")
    .sum({ requests: "requests", refused: db.raw("IF(status >= 400, requests, 0)"), microseconds: "microseconds" })
    .orderBy("requests", "desc");
  return rows.map((row) => ({ operation: row.operation!, requests: Number(row.requests), refused: Number(row.refused), meanMicroseconds: Number(row.microseconds) / Math.max(1, Number(row.requests)) }));
}
