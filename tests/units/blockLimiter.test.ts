import { describe, expect, it } from "vitest";
import { BlockLimiter, type Window } from "@/lib/limits/blockLimiter";

/** A shared counter as two instances would see it, without the database. */
class Counter {
  readonly counts = new Map<string, number>();
  calls = 0;
  async add(key: string, points: number): Promise<number> {
    this.calls += 1;
    await Promise.resolve();
    const before = this.counts.get(key) ?? 0;
    this.counts.set(key, before + points);
    return before;
  }
  async giveBack(key: string, points: number): Promise<void> {
    this.counts.set(key, (this.counts.get(key) ?? 0) - points);
  }
}

const secondAt = (now: number): Window => ({ id: String(Math.floor(now / 1_000)), endsAt: (Math.floor(now / 1_000) + 1) * 1_000 });

describe("a limit held over several instances in blocks", () => {
  it.each([5, 50, 1_000, 20_000])("lets %i requests of two instances through, within 5 %% or one a piece", async (limit) => {
    const counter = new Counter();
    const instances = [new BlockLimiter("burst", counter, secondAt), new BlockLimiter("burst", counter, secondAt)];
    let allowed = 0;
    for (let request = 0; request < limit * 2; request += 1) {
      const allowance = await instances[request % 2]!.spend("org_a", limit, 1, 500);
      if (allowance.allowed) allowed += 1;
    }
    expect(Math.abs(allowed - limit)).toBeLessThanOrEqual(Math.max(2, limit * 0.05));
  });

  it("starts anew in the next window", async () => {
    const limiter = new BlockLimiter("burst", new Counter(), secondAt);
    for (let request = 0; request < 4; request += 1) await limiter.spend("org_a", 2, 1, 500);
    expect((await limiter.spend("org_a", 2, 1, 500)).allowed).toBe(false);
    expect((await limiter.spend("org_a", 2, 1, 1_500)).allowed).toBe(true);
  });

  it("keeps subjects apart", async () => {
    const limiter = new BlockLimiter("burst", new Counter(), secondAt);
    for (let request = 0; request < 4; request += 1) await limiter.spend("org_a", 2, 1, 500);
    expect((await limiter.spend("org_b", 2, 1, 500)).allowed).toBe(true);
  });

  it("asks the shared counter far less often than it is asked itself", async () => {
    const counter = new Counter();
    const limiter = new BlockLimiter("burst", counter, secondAt);
    for (let request = 0; request < 1_000; request += 1) await limiter.spend("org_a", 1_000, 1, 500);
    expect(counter.calls).toBeLessThanOrEqual(55);
  });

  it("gives back what it holds but did not spend", async () => {
    const counter = new Counter();
    const limiter = new BlockLimiter("quota", counter, secondAt);
    for (let request = 0; request < 10; request += 1) await limiter.spend("org_a", 1_000, 1, 500);
    await limiter.giveBack();
    expect([...counter.counts.values()]).toEqual([10]);
  });

  it("spends many points at once, all or none", async () => {
    const limiter = new BlockLimiter("quota", new Counter(), secondAt);
    expect((await limiter.spend("org_a", 100, 60, 500)).allowed).toBe(true);
    expect((await limiter.spend("org_a", 100, 60, 500)).allowed).toBe(false);
    expect((await limiter.spend("org_a", 100, 40, 500)).allowed).toBe(true);
  });
});
