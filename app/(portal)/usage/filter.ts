import { z } from "zod";
import { dayAgo, type UsageFilter } from "@/lib/usage/usageQuery";

const day = z.iso.date();
const LONGEST_DAYS = 400;

/** The query of the usage page and its download: what does not fit is left out rather than refused. */
const query = z.object({
  from: day.optional().catch(undefined),
  to: day.optional().catch(undefined),
  environment: z.enum(["sandbox", "production"]).optional().catch(undefined),
  key: z.string().max(40).optional().catch(undefined),
});

export function usageFilter(organisationId: string, given: Record<string, string | string[] | undefined>): UsageFilter {
  const { from, to, environment, key } = query.parse(given);
  const last = to ?? dayAgo(0);
  const earliest = new Date(new Date(`${last}T00:00:00Z`).getTime() - LONGEST_DAYS * 86_400_000).toISOString().slice(0, 10);
  const first = from ?? dayAgo(20);
  const start = first > last ? last : first < earliest ? earliest : first;
  return { organisationId, from: start, to: last, ...(environment && { environment }), ...(key && { keyId: key }) };
}
