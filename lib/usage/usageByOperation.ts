import { database } from "@/db/connection";
import { usageRows, type UsageFilter } from "./usageQuery";

export interface OperationUsage {
  operation: string;
  requests: number;
  refused: number;
  items: number;
  meanMicroseconds: number;
  slowestMicroseconds: number;
}

/** Requests of each operation with their latency, the most used first. */
export async function usageByOperation(filter: UsageFilter): Promise<OperationUsage[]> {
  const db = database();
  const rows: Record<string, string>[] = await usageRows(filter)
    .select("operation")
    .sum({ requests: "requests", refused: db.raw("IF(status >= 400, requests, 0)"), items: "items", microseconds: "microseconds" })
    .max({ slowest: "slowest_microseconds" })
    .groupBy("operation")
    .orderBy("requests", "desc");
  return rows.map((row) => ({
    operation: row.operation!,
    requests: Number(row.requests),
    refused: Number(row.refused),
    items: Number(row.items),
    meanMicroseconds: Number(row.microseconds) / Math.max(1, Number(row.requests)),
    slowestMicroseconds: Number(row.slowest),
  }));
}
