import { airflow, type AirflowInput } from "@/lib/airflow/calculations/airflow";
import { median } from "./load";

const ITEMS = 1_000;
const LINES = 100_000;
const ROUNDS = 5;

/** A JSON batch over HTTP against the engine and JSON by themselves, and the memory of a streamed one. */
export async function benchBatch(url: string, key: string, body: string, processId: number): Promise<void> {
  const headers = { authorization: `Bearer ${key}` };
  const item = `{"operation":"airflow","input":${body}}`;
  const whole = `{"items":[${Array.from({ length: ITEMS }, () => item).join(",")}]}`;
  const ratios: number[] = [];
  for (let round = 0; round <= ROUNDS; round += 1) {
    const alone = performance.now();
    const { items } = JSON.parse(whole) as { items: { input: AirflowInput }[] };
    JSON.stringify({ items: items.map(({ input }) => ({ result: airflow(input) })) });
    const middle = performance.now();
    const answer = await fetch(url, { method: "POST", body: whole, headers: { ...headers, "content-type": "application/json" } });
    await answer.arrayBuffer();
    if (answer.status !== 200) throw new Error(`the batch was answered with ${answer.status}`);
    if (round > 0) ratios.push((performance.now() - middle) / (middle - alone));
  }
  console.log("\nBatch of 1,000 traverses over HTTP; median of 5 rounds");
  console.log(`  HTTP over engine and JSON by themselves               ${median(ratios).toFixed(2)}`);
  await streamed(url, headers, item, processId);
}

/** Streams 100,000 lines both ways and watches the server's memory. */
async function streamed(url: string, headers: Record<string, string>, item: string, processId: number): Promise<void> {
  const { readFileSync } = await import("node:fs");
  const resident = (): number => Number(/VmRSS:\s+(\d+)/.exec(readFileSync(`/proc/${processId}/status`, "utf8"))![1]) / 1024;
  let sent = 0;
  const lines = new ReadableStream({
    pull(controller) {
      if (sent >= LINES) return controller.close();
      controller.enqueue(Buffer.from(`${item}\n`.repeat(100)));
      sent += 100;
    },
  });
  const samples: number[] = [resident()];
  const start = performance.now();
  const answer = await fetch(url, { method: "POST", body: lines, duplex: "half", headers: { ...headers, "content-type": "application/x-ndjson" } } as RequestInit);
  let answered = 0;
  let next = LINES / 10;
  for await (const chunk of answer.body as unknown as AsyncIterable<Uint8Array>) {
    for (const byte of chunk) if (byte === 10) answered += 1;
    if (answered >= next) {
      samples.push(resident());
      next += LINES / 10;
    }
  }
  const seconds = (performance.now() - start) / 1_000;
  console.log(`\nNDJSON, ${answered.toLocaleString("en")} lines in ${seconds.toFixed(1)} s; the server's resident memory in MiB at each tenth:`);
  console.log(`  ${samples.map((sample) => sample.toFixed(0)).join("  ")}`);
}
