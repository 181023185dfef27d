import autocannon from "autocannon";

export interface Target {
  url: string;
  headers?: Record<string, string>;
  body: string;
}

const ROUND_SECONDS = 2;
const CONNECTIONS = 16;

export async function requestsPerSecond({ url, headers, body }: Target): Promise<number> {
  const result = await autocannon({ url, method: "POST", headers: { "content-type": "application/json", ...headers }, body, connections: CONNECTIONS, duration: ROUND_SECONDS });
  if (result.non2xx > 0 || result.errors > 0) throw new Error(`${url}: ${result.non2xx} answers were not 2xx, ${result.errors} failed`);
  return result.requests.average;
}

/** What a round of turns found: requests per second of each target. */
export type Round = Record<string, number>;

/** Measures several targets in turns, so that a noisy machine troubles all of them alike. The first round warms up. */
export async function measure(targets: Record<string, Target>, rounds = 9): Promise<Round[]> {
  const seen: Round[] = [];
  for (let round = 0; round <= rounds; round += 1) {
    const figures: Round = {};
    for (const [name, target] of Object.entries(targets)) figures[name] = await requestsPerSecond(target);
    if (round > 0) seen.push(figures);
  }
  return seen;
}

/** Median over the rounds of a target's figure, and of its ratio to another's in the same round. */
export const summary = (rounds: Round[], name: string, reference: string): { perSecond: number; ratio: number } => ({
  perSecond: median(rounds.map((round) => round[name]!)),
  ratio: median(rounds.map((round) => round[name]! / round[reference]!)),
});

export function median(values: number[]): number {
  const sorted = [...values].sort((one, other) => one - other);
  return sorted[Math.floor(sorted.length / 2)]!;
}
