import { availableParallelism } from "node:os";
import { Problem } from "@/lib/problems/problem";
import { processWide } from "@/lib/runtime/processWide";

/** Hashing takes a core and a thread of the pool for some milliseconds; a core is left for the API. */
const AT_ONCE = Math.min(2, Math.max(1, availableParallelism() - 1));
/** As many as are through in a few seconds; whoever comes later is told to come back rather than kept waiting. */
const MOST_WAITING = 200;

interface Line {
  running: number;
  waiting: (() => void)[];
}
const line = (): Line => processWide("hashingLine", () => ({ running: 0, waiting: [] }));

/** Does work that takes a core, in its turn. Throws the problem when too many are waiting already. */
export async function inHashingLine<T>(work: () => Promise<T>): Promise<T> {
  const state = line();
  if (state.running < AT_ONCE) state.running += 1;
  else await turnIn(state);
  try {
    return await work();
  } finally {
    // The place is handed on as it is, so that nobody slips in between.
    const next = state.waiting.shift();
    if (next) next();
    else state.running -= 1;
  }
}

function turnIn({ waiting }: Line): Promise<void> {
  if (waiting.length >= MOST_WAITING) {
    throw new Problem("temporarily-unavailable", { detail: "Too many people are signing in at this moment. Nothing was changed; try again shortly.", headers: { "Retry-After": "5" } });
  }
  return new Promise((resolve) => waiting.push(resolve));
}
