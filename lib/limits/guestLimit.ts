import { RateLimiterMemory, RateLimiterRes } from "rate-limiter-flexible";
import { refusal } from "@/lib/problems/problem";
import { callerAddress } from "@/lib/runtime/caller";
import { processWide } from "@/lib/runtime/processWide";

const REQUESTS_PER_MINUTE = 30;
const guests = (): RateLimiterMemory => processWide("guestLimit", () => new RateLimiterMemory({ points: REQUESTS_PER_MINUTE, duration: 60 }));

/** Spends one of the calculations that a visitor without a key may try. Throws the problem when they are used up. */
export async function spendGuestRequest(): Promise<void> {
  try {
    await guests().consume(callerAddress() ?? "unknown");
  } catch (error) {
    if (!(error instanceof RateLimiterRes)) throw error;
    throw refusal("burst-limit-reached", `Without a key this takes ${REQUESTS_PER_MINUTE} calculations a minute. Create an account for a key of your own.`, {}, { "Retry-After": String(Math.max(1, Math.ceil(error.msBeforeNext / 1_000))) });
  }
}
