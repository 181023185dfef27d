import { database } from "@/db/connection";
import { daysBetween, usageRows, type UsageFilter } from "./usageQuery";

export interface DayUsage {
  /** As 2026-12-01. */
  day: string;
  succeeded: number;
  refused: number;
  items: number;
}

/** Requests of each day, days without any included. */
export async function usageByDay(filter: UsageFilter): Promise<DayUsage[]> {
  const db = database();
  const rows: { day: string; succeeded: string; refused: string; items: string }[] = await usageRows(filter)
    .select(db.raw("DATE_FORMAT(minute, '%Y-%m-%d') AS day"))
    .sum({ succeeded: db.raw("IF(status < 400, requests, 0)"), refused: db.raw("IF(status >= 400, requests, 0)"), items: "items" })
    .groupBy("day");
  const byDay = new Map(rows.map((row) => [row.day, row]));
  return daysBetween(filter.from, filter.to).map((day) => {
    const row = byDay.get(day);
    return { day, succeeded: Number(row?.succeeded ?? 0), refused: Number(row?.refused ?? 0), items: Number(row?.items ?? 0) };
  });
}
