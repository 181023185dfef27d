import type { SharedCounter } from "./sharedCounter";

/** A stretch of time with a limit of its own: a second, a calendar month. */
export interface Window {
  /** Unique for the window, e.g. its first millisecond. */
  id: string;
  endsAt: number;
}

export interface Allowance {
  allowed: boolean;
  limit: number;
  /** What is left as far as this instance knows. */
  remaining: number;
  endsAt: number;
}

/** The share of a limit that one instance takes at a time. Two instances can hold back at most twice that. */
const SHARE_OF_LIMIT = 1 / 50;
const LARGEST_BLOCK = 1_000;

/** What one instance holds of one subject's limit in one window. */
interface Holding {
  window: Window;
  held: number;
  /** The shared count as last seen. */
  counted: number;
  exhausted: boolean;
  fetching: Promise<void> | null;
}

/**
 * Holds a limit over all instances without asking the shared counter for every request: points are taken in blocks,
 * ahead of need, and spent in memory. The first request of a window goes ahead on credit and is charged with the block.
 */
export class BlockLimiter {
  private readonly holdings = new Map<string, Holding>();

  constructor(
    private readonly name: string,
    private readonly counter: Pick<SharedCounter, "add" | "giveBack">,
    private readonly windowAt: (now: number) => Window,
  ) {}

  /** Spends points of a subject's limit; waits for the shared counter only where this instance holds none. */
  spend(subject: string, limit: number, points: number, now: number): Allowance | Promise<Allowance> {
    const holding = this.holdingOf(subject, this.windowAt(now));
    const block = Math.min(LARGEST_BLOCK, Math.max(1, Math.floor(limit * SHARE_OF_LIMIT)));
    const isFirst = holding.counted === 0 && holding.held === 0 && !holding.fetching;
    if (isFirst && points <= block && points <= limit) {
      holding.held = -points;
      this.fetch(subject, holding, limit, block + points);
      return this.answer(holding, limit, true);
    }
    if (holding.held >= points) {
      holding.held -= points;
      if (holding.held < block / 2) this.fetch(subject, holding, limit, block);
      return this.answer(holding, limit, true);
    }
    return this.waitAndSpend(subject, holding, limit, points, block);
  }

  private async waitAndSpend(subject: string, holding: Holding, limit: number, points: number, block: number): Promise<Allowance> {
    while (holding.held < points && !holding.exhausted) {
      this.fetch(subject, holding, limit, Math.max(block, points - holding.held));
      await holding.fetching;
    }
    const allowed = holding.held >= points;
    if (allowed) holding.held -= points;
    return this.answer(holding, limit, allowed);
  }

  private fetch(subject: string, holding: Holding, limit: number, points: number): void {
    if (holding.exhausted || holding.fetching) return;
    holding.fetching = this.counter
      .add(this.key(subject, holding.window), points)
      .then((before) => {
        const granted = Math.max(0, Math.min(points, limit - before));
        holding.held += granted;
        holding.counted = before + points;
        holding.exhausted = granted < points;
      })
      .finally(() => {
        holding.fetching = null;
      });
  }

  /** Returns what is held but not spent, so that a restart does not cost anybody their quota. */
  async giveBack(): Promise<void> {
    for (const [subject, holding] of this.holdings) {
      if (holding.held > 0) await this.counter.giveBack(this.key(subject, holding.window), holding.held);
    }
    this.holdings.clear();
  }

  private key(subject: string, window: Window): string {
    return `${this.name}:${subject}:${window.id}`;
  }

  private holdingOf(subject: string, window: Window): Holding {
    const known = this.holdings.get(subject);
    if (known?.window.id === window.id) return known;
    const fresh: Holding = { window, held: 0, counted: 0, exhausted: false, fetching: null };
    this.holdings.set(subject, fresh);
    return fresh;
  }

  private answer(holding: Holding, limit: number, allowed: boolean): Allowance {
    const remaining = allowed ? Math.max(0, limit - Math.max(0, holding.counted - Math.max(0, holding.held))) : 0;
    return { allowed, limit, remaining, endsAt: holding.window.endsAt };
  }
}
