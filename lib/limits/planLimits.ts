import { type Problem, refusal } from "@/lib/problems/problem";
import type { Key } from "@/lib/keys/keyDirectory";
import { inBackground } from "@/lib/runtime/background";
import { processWide } from "@/lib/runtime/processWide";
import { onShutdown } from "@/lib/runtime/shutdown";
import { recordQuotaReached } from "@/lib/webhooks/quotaReached";
import { BlockLimiter, type Allowance, type Window } from "./blockLimiter";
import { SharedCounter } from "./sharedCounter";

const SECOND_MS = 1_000;
const DAY_SECONDS = 86_400;

const secondAt = (now: number): Window => {
  const start = Math.floor(now / SECOND_MS);
  return { id: String(start), endsAt: (start + 1) * SECOND_MS };
};

const monthAt = (now: number): Window => {
  const date = new Date(now);
  const [year, month] = [date.getUTCFullYear(), date.getUTCMonth() + 1];
  return { id: `${year}-${String(month).padStart(2, "0")}`, endsAt: Date.UTC(year, month, 1) };
};

const limiters = () =>
  processWide("planLimiters", () => {
    const burst = new BlockLimiter("burst", new SharedCounter(5), secondAt);
    const quota = new BlockLimiter("quota", new SharedCounter(40 * DAY_SECONDS), monthAt);
    onShutdown("quota", () => quota.giveBack());
    return { burst, quota };
  });

export interface PlanAllowances {
  burst: Allowance | null;
  quota: Allowance | null;
}

/** Spends one request of a second's and of the month's allowance. Throws the problem when either is used up. */
export async function spendRequest(key: Key, now: number): Promise<PlanAllowances> {
  const { burst, quota } = limiters();
  const subject = `${key.organisationId}:${key.environment}`;
  // Nearly always at hand, and then not waited for: the wait alone would cost as much as the arithmetic.
  const fromSecond = burst.spend(subject, key.requestsPerSecond, 1, now);
  const second = fromSecond instanceof Promise ? await fromSecond : fromSecond;
  if (!second.allowed) throw overLimit("burst-limit-reached", `The plan allows ${second.limit} requests a second.`, { burst: second, quota: null }, now);
  const fromMonth = quota.spend(subject, key.monthlyRequests, 1, now);
  const month = fromMonth instanceof Promise ? await fromMonth : fromMonth;
  if (!month.allowed) {
    inBackground("event of a quota reached", () => recordQuotaReached(key, now));
    throw overLimit("quota-reached", `The plan's ${month.limit} requests of this month are used up.`, { burst: second, quota: month }, now);
  }
  return { burst: second, quota: month };
}

/** Spends further calculations of the month's allowance: the items of a batch beyond its first. */
export async function spendItems(key: Key, items: number, now: number): Promise<void> {
  const month = await limiters().quota.spend(`${key.organisationId}:${key.environment}`, key.monthlyRequests, items, now);
  if (!month.allowed) throw overLimit("quota-reached", `Of the plan's ${month.limit} requests a month, fewer than these ${items} are left.`, { burst: null, quota: month }, now);
}

function overLimit(slug: "burst-limit-reached" | "quota-reached", detail: string, allowances: PlanAllowances, now: number): Problem {
  const { endsAt } = slug === "quota-reached" ? allowances.quota! : allowances.burst!;
  return refusal(slug, detail, {}, { "Retry-After": String(secondsUntil(endsAt, now)), ...limitHeaders(allowances, now) });
}

const secondsUntil = (moment: number, now: number): number => Math.max(1, Math.ceil((moment - now) / SECOND_MS));

/** `RateLimit` and `RateLimit-Policy` as draft-ietf-httpapi-ratelimit-headers has them. */
export function limitHeaders({ burst, quota }: PlanAllowances, now: number): Record<string, string> {
  const policies: string[] = [];
  const states: string[] = [];
  const add = (name: string, seconds: number, { limit, remaining, endsAt }: Allowance): void => {
    policies.push(`"${name}";q=${limit};w=${seconds}`);
    states.push(`"${name}";r=${remaining};t=${secondsUntil(endsAt, now)}`);
  };
  if (burst) add("burst", 1, burst);
  if (quota) add("month", 31 * DAY_SECONDS, quota);
  return { "RateLimit-Policy": policies.join(", "), RateLimit: states.join(", ") };
}
