import type { Environment } from "@/lib/keys/keyText";
import { dayAgo, firstOfMonth, usageRows } from "./usageQuery";

/** Calculations of the current month by environment: what the plan's quota is measured against. */
export async function quotaBurn(organisationId: string): Promise<Record<Environment, number>> {
  const rows: { environment: Environment; items: string }[] = await usageRows({ organisationId, from: firstOfMonth(), to: dayAgo(0) })
    .whereNot("status", 429)
    .select("environment")
    .sum({ items: "items" })
    .groupBy("environment");
  const burn: Record<Environment, number> = { sandbox: 0, production: 0 };
  for (const { environment, items } of rows) burn[environment] = Number(items);
  return burn;
}
