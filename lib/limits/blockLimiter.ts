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

/** The share of what is left that one instance takes at a time: large steps at first, small ones near the limit. */
const SHARE_OF_REST = 1 / 4;
const LARGEST_BLOCK = 5_000;
/** What an instance may spend of a fresh window before the shared counter has answered. */
const CREDIT_SHARE = 1 / 50;
/** A window in use is prepared this long before it begins. */
const AHEAD_MS = 500;

/** What one instance holds of one subject's limit in one window. */
interface Holding {
  window: Window;
  limit: number;
  /** Below zero: spent on credit, charged when the shared counter answers. */
  held: number;
  /** The shared count as last seen. */
  counted: number;
  exhausted: boolean;
  fetching: Promise<void> | null;
}

/**
 * Holds a limit over all instances without asking the shared counter for every request: points are taken in blocks,
 * ahead of need, and spent in memory. The first requests of a fresh window go ahead on credit and are charged later.
 */
export class BlockLimiter {
  private readonly current = new Map<string, Holding>();
  private readonly next = new Map<string, Holding>();

  constructor(
    private readonly name: string,
    private readonly counter: Pick<SharedCounter, "add" | "giveBack">,
    private readonly windowAt: (now: number) => Window,
  ) {}

  /** Spends points of a subject's limit; waits for the shared counter only where this instance holds too few. */
  spend(subject: string, limit: number, points: number, now: number): Allowance | Promise<Allowance> {
    const holding = this.holdingOf(subject, limit, this.windowAt(now));
    if (holding.window.endsAt - now < AHEAD_MS) this.prepareNext(subject, limit, holding.window);
    const credit = holding.counted === 0 ? Math.floor(limit * CREDIT_SHARE) : 0;
    if (holding.held + credit < points) return this.waitAndSpend(subject, holding, points);
    holding.held -= points;
    if (holding.held < blockOf(holding) / 2) this.fetch(subject, holding, 0);
    return answer(holding, true);
  }

  private async waitAndSpend(subject: string, holding: Holding, points: number): Promise<Allowance> {
    while (holding.held < points && !holding.exhausted) {
      this.fetch(subject, holding, points - holding.held);
      await holding.fetching;
    }
    const allowed = holding.held >= points;
    if (allowed) holding.held -= points;
    return answer(holding, allowed);
  }

  private fetch(subject: string, holding: Holding, atLeast: number): void {
    if (holding.exhausted || holding.fetching) return;
    const points = Math.max(blockOf(holding), atLeast);
    holding.fetching = this.counter
      .add(this.key(subject, holding.window), points)
      .then((before) => {
        const granted = Math.max(0, Math.min(points, holding.limit - before));
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
    for (const [subject, holding] of this.current) {
      await holding.fetching;
      if (holding.held > 0) await this.counter.giveBack(this.key(subject, holding.window), holding.held);
    }
    this.current.clear();
  }

  private key(subject: string, window: Window): string {
    return `${this.name}:${subject}:${window.id}`;
  }

  private holdingOf(subject: string, limit: number, window: Window): Holding {
    const known = this.current.get(subject);
    if (known?.window.id === window.id) {
      known.limit = limit;
      return known;
    }
    const prepared = this.next.get(subject);
    this.next.delete(subject);
    const holding = prepared?.window.id === window.id ? prepared : freshHolding(window, limit);
    this.current.set(subject, holding);
    return holding;
  }

  private prepareNext(subject: string, limit: number, { endsAt }: Window): void {
    const window = this.windowAt(endsAt);
    if (this.next.get(subject)?.window.id === window.id) return;
    const holding = freshHolding(window, limit);
    this.next.set(subject, holding);
    this.fetch(subject, holding, 0);
  }
}

const freshHolding = (window: Window, limit: number): Holding => ({ window, limit, held: 0, counted: 0, exhausted: false, fetching: null });

const blockOf = ({ limit, counted }: Holding): number => Math.min(LARGEST_BLOCK, Math.max(1, Math.floor((limit - counted) * SHARE_OF_REST)));

function answer({ window, limit, held, counted }: Holding, allowed: boolean): Allowance {
  const remaining = allowed ? Math.max(0, Math.min(limit, limit - counted + held)) : 0;
  return { allowed, limit, remaining, endsAt: window.endsAt };
}
