import autocannon from "autocannon";

export interface Target {
  url: string;
  headers?: Record<string, string>;
  body: string;
}

const ROUND_SECONDS = 4;
const CONNECTIONS = 16;

async function requestsPerSecond({ url, headers, body }: Target): Promise<number> {
  const result = await autocannon({ url, method: "POST", headers: { "content-type": "application/json", ...headers }, body, connections: CONNECTIONS, duration: ROUND_SECONDS });
  if (result.non2xx > 0 || result.errors > 0) throw new Error(`${url}: ${result.non2xx} answers were not 2xx, ${result.errors} failed`);
  return result.requests.average;
}

/**
 * Requests per second of several targets, measured in turns so that a noisy machine troubles all of them alike.
 * @returns The median of the rounds for each target.
 */
export async function measure(targets: Record<string, Target>, rounds = 3): Promise<Record<string, number>> {
  const names = Object.keys(targets);
  for (const name of names) await requestsPerSecond(targets[name]!);
  const seen: Record<string, number[]> = Object.fromEntries(names.map((name) => [name, []]));
  for (let round = 0; round < rounds; round += 1) {
    for (const name of names) seen[name]!.push(await requestsPerSecond(targets[name]!));
  }
  return Object.fromEntries(names.map((name) => [name, median(seen[name]!)]));
}

export function median(values: number[]): number {
  const sorted = [...values].sort((one, other) => one - other);
  return sorted[Math.floor(sorted.length / 2)]!;
}
