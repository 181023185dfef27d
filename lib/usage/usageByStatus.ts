import { usageRows, type UsageFilter } from "./usageQuery";

/** Requests by the status they were answered with, ascending. */
export async function usageByStatus(filter: UsageFilter): Promise<{ status: number; requests: number }[]> {
  const rows: { status: number; requests: string }[] = await usageRows(filter).select("status").sum({ requests: "requests" }).groupBy("status").orderBy("status");
  return rows.map(({ status, requests }) => ({ status, requests: Number(requests) }));
}
