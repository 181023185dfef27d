import { database } from "@/db/connection";

export interface Plan {
  id: string;
  name: string;
  monthlyRequests: number;
  requestsPerSecond: number;
}

/** What an organisation's plan allows. */
export async function planOf(planId: string): Promise<Plan> {
  const row = await database()("plans").where({ id: planId }).first();
  return { id: row.id, name: row.name, monthlyRequests: row.monthly_requests, requestsPerSecond: row.requests_per_second };
}
