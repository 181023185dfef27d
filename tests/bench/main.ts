import { spawn, spawnSync, type ChildProcess } from "node:child_process";
import { rmSync } from "node:fs";
import path from "node:path";
import { prepareDatabase } from "@/db/prepare";
import { startPrivateServer, stopLeftover } from "@/db/privateServer";
import { startApp } from "@/lib/launch/appProcess";
import { ensureBuild } from "@/lib/launch/build";
import { ensureDebianProgram, MARIADB } from "@/lib/launch/debian";
import { ROOT } from "@/lib/launch/packages.mjs";
import { makeKey, makeOrganisation, testDatabase } from "../support/accounts";
import { benchBatch } from "./batch";
import { benchLists } from "./lists";
import { benchEngine } from "./engine";
import { measure, requestsPerSecond, summary, type Round, type Target } from "./load";

const BARE = path.join(ROOT, "tests/bench/bare");
const PORTS = { bare: 4571, one: 4572, two: 4573 };
const FOLDER = path.join(ROOT, ".data", "bench");

/** A rectangular traverse of 25 velocity pressures, as a field application would send it. */
const BODY = JSON.stringify({
  duct: { shape: "rectangular", measured: "outside", width: { value: 26, unit: "in" }, height: { value: 18, unit: "in" }, wall: { lining: { value: 1, unit: "in" } } },
  readings: {
    kind: "velocity_pressure",
    unit: "in_wg",
    lines: [
      [0.061, 0.074, 0.078, 0.073, 0.06],
      [0.071, 0.088, 0.092, 0.086, 0.07],
      [0.075, 0.091, 0.095, 0.09, 0.073],
      [0.07, 0.087, 0.091, 0.087, 0.071],
      [0.06, 0.073, 0.077, 0.074, 0.062],
    ],
  },
  air: { dryBulb: { value: 58, unit: "degF" }, relativeHumidity: { value: 85, unit: "percent" }, altitude: { value: 1640, unit: "ft" } },
});

async function startBare(): Promise<ChildProcess> {
  const built = spawnSync(process.execPath, [path.join(ROOT, "node_modules/next/dist/bin/next"), "build", BARE], { encoding: "utf8", env: { ...process.env, NEXT_TELEMETRY_DISABLED: "1", NODE_ENV: "production" } });
  if (built.status !== 0) throw new Error(`the bare application did not build:\n${built.stdout}${built.stderr}`);
  const child = spawn(process.execPath, [path.join(BARE, "server.mjs")], { cwd: ROOT, stdio: ["ignore", "inherit", "inherit", "ipc"], env: { ...process.env, NODE_ENV: "production", PORT: String(PORTS.bare) } });
  await new Promise((resolve) => child.once("message", resolve));
  return child;
}

/**
 * Measures in one run and prints ratios; absolute figures belong to this machine at this moment.
 * @param only A part by itself: `http`, `engine`, `batch` or `lists`; everything when left out.
 */
export async function main([only]: string[]): Promise<void> {
  const wanted = (part: string): boolean => only === undefined || only === part;
  ensureDebianProgram(MARIADB);
  await stopLeftover(FOLDER);
  rmSync(FOLDER, { recursive: true, force: true });
  const database = await startPrivateServer(FOLDER);
  process.env.DATABASE_URL = database.url;
  await prepareDatabase(database.url);
  const environment = { ...process.env, NODE_ENV: "production" as const, AVERDUCT_DIST_DIR: ".next-test", LOG_LEVEL: "warn" };
  ensureBuild(".next-test", environment);
  const bare = await startBare();
  const one = await startApp({ ...environment, PORT: String(PORTS.one) });
  const two = await startApp({ ...environment, PORT: String(PORTS.two) });
  try {
    const organisationId = await makeOrganisation({ requestsPerSecond: 1_000_000, monthlyRequests: 2_000_000_000 });
    const { text } = await makeKey({ organisationId });
    const airflow = (port: number): Target => ({ url: `http://127.0.0.1:${port}/api/v1/calculations/airflow`, headers: { authorization: `Bearer ${text}` }, body: BODY });
    const bareTarget: Target = { url: `http://127.0.0.1:${PORTS.bare}/echo`, body: BODY };
    const base = `http://127.0.0.1:${PORTS.one}`;
    if (wanted("http")) await inTurns(bareTarget, airflow(PORTS.one), airflow(PORTS.two));
    if (wanted("engine")) benchEngine(BODY);
    if (wanted("batch")) await benchBatch(`${base}/api/v1/calculations/batch`, text, BODY, one.child.pid!);
    if (wanted("lists")) await benchLists(base, organisationId);
    if (wanted("http")) await bothAtOnce(bareTarget, airflow(PORTS.one), airflow(PORTS.two));
  } finally {
    bare.kill("SIGTERM");
    await Promise.all([one.stop(), two.stop()]);
    await testDatabase().destroy();
    await database.stop();
  }
}

async function inTurns(bare: Target, airflow: Target, second: Target): Promise<void> {
  const rounds = await measure({ bare, airflow, second });
  console.log("\nHTTP, one instance, 16 connections, 25 readings a request; medians of 9 rounds in turns");
  row("bare Next.js route handler: parse and echo", summary(rounds, "bare", "bare"));
  row("airflow: key, limits, validation, engine, usage", summary(rounds, "airflow", "bare"));
  row("the same on a second instance, one database", summary(rounds, "second", "bare"));
}

/** Two instances loaded at the same time share this machine's cores, so the bare handler is loaded twice as well. */
async function bothAtOnce(bare: Target, one: Target, two: Target): Promise<void> {
  const together = async (targets: Target[]): Promise<number> => {
    const figures = await Promise.all(targets.map((target) => requestsPerSecond(target)));
    return figures.reduce((sum, figure) => sum + figure, 0);
  };
  const rounds: Round[] = [];
  for (let round = 0; round < 5; round += 1) rounds.push({ bare: await together([bare, bare]), both: await together([one, two]) });
  console.log("\nHTTP, two loads at once; medians of 5 rounds in turns");
  row("bare handler, both loads on one instance", summary(rounds, "bare", "bare"));
  row("airflow, two instances on one database, summed", summary(rounds, "both", "bare"));
}

const row = (title: string, { perSecond, ratio }: { perSecond: number; ratio: number }): void =>
  console.log(`  ${title.padEnd(52)} ${perSecond.toFixed(0).padStart(7)}/s   ${ratio.toFixed(2)}`);
