import { RateLimiterMemory, RateLimiterRes, type RateLimiterAbstract } from "rate-limiter-flexible";
import { log } from "@/lib/runtime/log";
import { storedLimiter } from "./storedLimiter";

/** A shared answer that takes longer is not waited for: this instance then counts by itself for a while. */
const PATIENCE_MS = 1_000;
const ALONE_MS = 3_000;
/** Timers do not reach further, and a database is not away for longer. */
const LONGEST_ALONE_SECONDS = 7 * 86_400;
/** The limiters only count; what a plan allows is decided from the count, so they never refuse by themselves. */
const NO_LIMIT = 2 ** 31 - 1;

/** Counts points under a key over all instances, and by itself while the shared store is away. */
export class SharedCounter {
  private readonly shared: RateLimiterAbstract;
  private readonly alone: RateLimiterAbstract;
  private aloneUntil = 0;

  /** @param keepSeconds How long a key's count is kept after its first point. */
  constructor(keepSeconds: number) {
    this.alone = new RateLimiterMemory({ points: NO_LIMIT, duration: Math.min(keepSeconds, LONGEST_ALONE_SECONDS) });
    this.shared = storedLimiter(NO_LIMIT, keepSeconds);
  }

  /** Adds points and returns what the count was before. */
  async add(key: string, points: number): Promise<number> {
    if (Date.now() < this.aloneUntil) return this.addAlone(key, points);
    try {
      return (await withinPatience(this.shared.consume(key, points))).consumedPoints - points;
    } catch (error) {
      if (error instanceof RateLimiterRes) return error.consumedPoints - points;
      log().warn({ err: error }, "the shared limiter does not answer; this instance counts alone");
      this.aloneUntil = Date.now() + ALONE_MS;
      return this.addAlone(key, points);
    }
  }

  private async addAlone(key: string, points: number): Promise<number> {
    return (await this.alone.consume(key, points)).consumedPoints - points;
  }

  /** Gives points back that were taken but not spent. */
  async giveBack(key: string, points: number): Promise<void> {
    await this.shared.reward(key, points);
  }
}

async function withinPatience<T>(answer: Promise<T>): Promise<T> {
  let timer: NodeJS.Timeout | undefined;
  const timeout = new Promise<never>((_, reject) => {
    timer = setTimeout(() => reject(new Error(`no answer within ${PATIENCE_MS} ms`)), PATIENCE_MS);
  });
  return Promise.race([answer, timeout]).finally(() => clearTimeout(timer));
}
