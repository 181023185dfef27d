import { airflow, type AirflowInput } from "@/lib/airflow/calculations/airflow";
import { median } from "./load";

const TRAVERSES = 5_000;
const ROUNDS = 7;

const time = (work: () => void): number => {
  const start = performance.now();
  work();
  return performance.now() - start;
};

/** The engine on 5,000 traverses of 25 points, against JSON's own work on the same requests and answers. */
export function benchEngine(body: string): void {
  const ratios: number[] = [];
  let perTraverse = 0;
  for (let round = 0; round <= ROUNDS; round += 1) {
    const requests: AirflowInput[] = [];
    const parsing = time(() => {
      for (let index = 0; index < TRAVERSES; index += 1) requests.push(JSON.parse(body) as AirflowInput);
    });
    const answers: unknown[] = [];
    const computing = time(() => {
      for (const request of requests) answers.push(airflow(request));
    });
    const writing = time(() => {
      for (const answer of answers) JSON.stringify(answer);
    });
    // The first round warms the engine up.
    if (round > 0) ratios.push(computing / (parsing + writing));
    perTraverse = (computing * 1_000) / TRAVERSES;
  }
  console.log("\nEngine, 5,000 traverses of 25 points, working off; median of 7 rounds");
  console.log(`  engine over JSON.parse and JSON.stringify             ${median(ratios).toFixed(2)}   (${perTraverse.toFixed(0)} µs a traverse in the last round)`);
}
