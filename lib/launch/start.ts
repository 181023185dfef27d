import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import path from "node:path";
import { setTimeout as pause } from "node:timers/promises";
import { startPrivateServer, type PrivateServer } from "@/db/privateServer";
import { prepareDatabase } from "@/db/prepare";
import { seedDemo } from "@/db/seeds/demo";
import { readConfig } from "@/lib/runtime/config";
import { startApp, type AppProcess } from "./appProcess";
import { ensureBuild } from "./build";
import { ensureDebianProgram, MARIADB } from "./debian";
import { ROOT } from "./packages.mjs";
import { isPortFree } from "./portFree";
import { CannotStart, say } from "./say.mjs";
import { printWelcome } from "./welcome";
import { DATABASE_FOLDER } from "./withDatabase";

const DATA_FOLDER = path.join(ROOT, ".data");
/** A part that ends by itself is started again, at most this often. */
const RESTART_PAUSE_MS = 1_000;
/** What a kill -9 left behind notices it and ends within this. */
const LEFTOVER_PATIENCE_MS = 5_000;
const PARENT_WATCH_MS = 250;
const UNREACHABLE_URL = "mysql://averduct@127.0.0.1:1/averduct";

/** Everything from a fresh clone to a served application; ends when it is told to stop. */
export async function start({ development }: { development: boolean }): Promise<void> {
  const given: NodeJS.ProcessEnv = { ...process.env, NODE_ENV: development ? "development" : "production" };
  const { HOST, PORT } = readConfig({ ...given, DATABASE_URL: given.DATABASE_URL ?? UNREACHABLE_URL });
  await takeFolder();
  if (!(await within(LEFTOVER_PATIENCE_MS, () => isPortFree(HOST, PORT)))) {
    throw new CannotStart(`Port ${PORT} on ${HOST} is taken. Stop what uses it, or choose another: PORT=${PORT + 1} npm start`);
  }
  const url = given.AVERDUCT_URL ?? `http://localhost:${PORT}`;
  const run = new Run();
  const databaseUrl = given.DATABASE_URL ?? (await run.startDatabase());
  const environment: NodeJS.ProcessEnv = {
    ...given,
    DATABASE_URL: databaseUrl,
    AVERDUCT_URL: url,
    LOG_LEVEL: given.LOG_LEVEL ?? "warn",
    AVERDUCT_DIST_DIR: development ? ".next-dev" : ".next",
  };
  try {
    // For what the seed does through the product's own functions, which read the configuration.
    process.env.DATABASE_URL = databaseUrl;
    say("Bringing the database up to date …");
    await prepareDatabase(databaseUrl);
    const demo = given.AVERDUCT_MODE === "production" ? null : await seedDemo(databaseUrl, path.join(DATA_FOLDER, "demo.json"));
    if (!development) ensureBuild(".next", environment);
    await run.startApplication(environment);
    printWelcome(url, demo);
    await run.untilStopped();
  } finally {
    await run.stop();
    rmSync(path.join(DATA_FOLDER, "launcher.pid"), { force: true });
  }
}

/** Two starts on one data folder would run two servers on the same files. */
async function takeFolder(): Promise<void> {
  mkdirSync(DATA_FOLDER, { recursive: true, mode: 0o700 });
  const pidFile = path.join(DATA_FOLDER, "launcher.pid");
  const pid = existsSync(pidFile) ? Number(readFileSync(pidFile, "utf8")) : 0;
  if (pid && pid !== process.pid && !(await within(LEFTOVER_PATIENCE_MS, () => !isLauncher(pid)))) {
    throw new CannotStart(`Averduct already runs from this folder (process ${pid}). Stop it first with Ctrl-C, or: kill ${pid}`);
  }
  writeFileSync(pidFile, String(process.pid));
}

/** Asks until the answer is yes or the time is over. */
async function within(milliseconds: number, isSo: () => boolean | Promise<boolean>): Promise<boolean> {
  const deadline = Date.now() + milliseconds;
  while (!(await isSo())) {
    if (Date.now() > deadline) return false;
    await pause(100);
  }
  return true;
}

function isLauncher(pid: number): boolean {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, "utf8").includes("lib/launch/start.mjs");
  } catch {
    return false;
  }
}

/** Run through npm, ends with it: npm killed outright cannot pass a signal on. */
function stopWithParent(stop: () => void): void {
  const parent = process.ppid;
  if (!process.env.npm_lifecycle_event) return;
  setInterval(() => process.ppid !== parent && stop(), PARENT_WATCH_MS).unref();
}

/** What runs: the database and the application, each started again if it ends by itself. */
class Run {
  private database: PrivateServer | null = null;
  private application: AppProcess | null = null;
  private stopping = false;
  private readonly stopRequested = new Promise<void>((resolve) => {
    const stop = (): void => {
      this.stopping = true;
      resolve();
    };
    process.once("SIGINT", stop);
    process.once("SIGTERM", stop);
    process.once("SIGHUP", stop);
    stopWithParent(stop);
  });

  async startDatabase(): Promise<string> {
    ensureDebianProgram(MARIADB);
    say("Starting MariaDB …");
    this.database = await startPrivateServer(DATABASE_FOLDER);
    void this.keepDatabase(this.database);
    return this.database.url;
  }

  async startApplication(environment: NodeJS.ProcessEnv): Promise<void> {
    say("Starting the application …");
    this.application = await startApp(environment);
    void this.keepApplication(this.application, environment);
  }

  untilStopped(): Promise<void> {
    return this.stopRequested;
  }

  async stop(): Promise<void> {
    this.stopping = true;
    if (this.application) say("Stopping …");
    await this.application?.stop();
    await this.database?.stop();
  }

  private async keepDatabase(server: PrivateServer): Promise<void> {
    await server.ended;
    if (this.stopping) return;
    say("MariaDB ended by itself; starting it again …");
    await pause(RESTART_PAUSE_MS);
    this.database = await startPrivateServer(DATABASE_FOLDER, Number(new URL(server.url).port));
    return this.keepDatabase(this.database);
  }

  private async keepApplication(app: AppProcess, environment: NodeJS.ProcessEnv): Promise<void> {
    await app.ended;
    if (this.stopping) return;
    say("The application ended by itself; starting it again …");
    await pause(RESTART_PAUSE_MS);
    this.application = await startApp(environment);
    return this.keepApplication(this.application, environment);
  }
}
