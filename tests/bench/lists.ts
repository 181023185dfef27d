import { newId } from "@/lib/ids/newId";
import { makeKey, testDatabase } from "../support/accounts";
import { median } from "./load";

const FEW = 2_000;
const MANY = 200_000;
const ROUNDS = 15;
const LIMIT = 50;

/** How long the list of traverses takes with 2,000 stored and with 200,000, as a ratio for each way of asking. */
export async function benchLists(base: string, organisationId: string): Promise<void> {
  const { text } = await makeKey({ organisationId, scopes: ["records:read"] });
  const references = await arrange(organisationId);
  const asked = (rows: number): Record<string, string> => ({
    "first page": "",
    "first page by when taken": "sort=-taken",
    "deep page": `after=${cursor(idOf(rows / 2), idOf(rows / 2))}`,
    "deep page by when taken": `sort=-taken&after=${cursor(takenAt(rows / 2), idOf(rows / 2))}`,
    project: `projectId=${references.projects[1]}`,
    "project, by when taken": `projectId=${references.projects[1]}&sort=taken`,
    status: "status=issued",
    system: "system=AHU-7",
    instrument: `instrumentId=${references.instruments[2]}&sort=-taken`,
    "taken between": `takenFrom=${takenAt(rows * 0.7)}&takenBefore=${takenAt(rows * 0.2)}&sort=taken`,
    "outside tolerance": "outsideTolerance=true&sort=-taken",
    "status and project": `status=issued&projectId=${references.projects[1]}`,
  });
  await store(organisationId, references, 1, FEW);
  const before = await timed(base, text, asked(FEW));
  await store(organisationId, references, FEW + 1, MANY);
  const after = await timed(base, text, asked(MANY));
  console.log(`\nThe list of traverses over HTTP, ${LIMIT} a page; medians of ${ROUNDS}, with ${FEW} stored and with ${MANY}`);
  for (const [name, few] of Object.entries(before)) console.log(`  ${name.padEnd(32)} ${few.toFixed(1).padStart(7)} ms ${after[name]!.toFixed(1).padStart(7)} ms   ${(after[name]! / few).toFixed(2)}`);
}

async function timed(base: string, key: string, queries: Record<string, string>): Promise<Record<string, number>> {
  const taken: Record<string, number> = {};
  for (const [name, query] of Object.entries(queries)) {
    const times: number[] = [];
    for (let round = -2; round < ROUNDS; round += 1) {
      const started = performance.now();
      const answer = await fetch(`${base}/api/v1/traverses?limit=${LIMIT}&${query}`, { headers: { authorization: `Bearer ${key}` } });
      const { items } = (await answer.json()) as { items: unknown[] };
      if (items.length !== LIMIT) throw new Error(`${name}: ${items.length} items on a page of ${LIMIT}, status ${answer.status}`);
      if (round >= 0) times.push(performance.now() - started);
    }
    taken[name] = median(times);
  }
  return taken;
}

interface References {
  projects: string[];
  instruments: string[];
}

async function arrange(organisationId: string): Promise<References> {
  const realm = { organisation_id: organisationId, environment: "sandbox" };
  const projects = Array.from({ length: 20 }, () => newId("prj"));
  const instruments = Array.from({ length: 10 }, () => newId("ins"));
  await testDatabase()("projects").insert(projects.map((id, index) => ({ id, ...realm, name: `Project ${index}` })));
  await testDatabase()("instruments").insert(instruments.map((id, index) => ({ id, ...realm, name: `Instrument ${index}`, properties: '{"principle":"thermal"}' })));
  return { projects, instruments };
}

/** The n-th traverse is older than the one before by ten minutes, and was made later. */
const BEGINNING = Date.UTC(2026, 10, 1);
const idOf = (number: number): string => `trv_${String(Math.floor(number)).padStart(26, "0")}`;
const takenAt = (number: number): string => new Date(BEGINNING - Math.floor(number) * 600_000).toISOString();
const cursor = (value: string, id: string): string => Buffer.from(JSON.stringify([value, id])).toString("base64url");

/** Written by the database itself, with contents of about the size that they have. */
async function store(organisationId: string, { projects, instruments }: References, from: number, to: number): Promise<void> {
  const nth = (list: string[]): string => `ELT(1 + seq % ${list.length}, ${list.map((one) => `'${one}'`).join(", ")})`;
  await testDatabase().raw(
    `INSERT INTO traverses (id, organisation_id, environment, status, project_id, instrument_id, system, taken_at, taken_or_created_at, input, result, summary, percent_of_design, outside_tolerance)
     SELECT CONCAT('trv_', LPAD(seq, 26, '0')), ?, 'sandbox', ELT(1 + seq % 4, 'draft', 'issued', 'issued', 'superseded'), ${nth(projects)}, ${nth(instruments)}, CONCAT('AHU-', seq % 12),
       TIMESTAMP '2026-11-01 00:00:00' - INTERVAL 10 * seq MINUTE, TIMESTAMP '2026-11-01 00:00:00' - INTERVAL 10 * seq MINUTE, CONCAT('{"notes":"', REPEAT('reading ', 80), '"}'), CONCAT('{"notes":"', REPEAT('working ', 250), '"}'),
       '{"location":"Supply main","technician":"R. Okonjo-Lindqvist","airflow":{"value":2531.4,"unit":"ft3/min"},"verdict":"within"}', 80 + seq % 40, IF(seq % 10 = 0, 1, 0)
     FROM seq_${from}_to_${to}`,
    [organisationId],
  );
}
