import { existsSync, readFileSync } from "node:fs";
import path from "node:path";
import mysql from "mysql2/promise";
import { startPrivateServer } from "@/db/privateServer";
import { runShutdownTasks } from "@/lib/runtime/shutdown";
import { ensureDebianProgram, MARIADB } from "./debian";
import { ROOT } from "./packages.mjs";

export const DATABASE_FOLDER = path.join(ROOT, ".data", "mariadb");

/** Gives a command the installation's database: the one that runs, or its own for as long as the command takes. */
export async function withDatabase(work: (databaseUrl: string) => Promise<void>): Promise<void> {
  const running = process.env.DATABASE_URL ?? (await runningUrl());
  if (!running) ensureDebianProgram(MARIADB);
  const own = running ? null : await startPrivateServer(DATABASE_FOLDER);
  process.env.DATABASE_URL = running ?? own!.url;
  try {
    await work(process.env.DATABASE_URL);
  } finally {
    await runShutdownTasks((name, error) => console.error(`${name} could not be ended:`, error));
    await own?.stop();
  }
}

async function runningUrl(): Promise<string | null> {
  const file = path.join(DATABASE_FOLDER, "url");
  if (!existsSync(file)) return null;
  const url = readFileSync(file, "utf8").trim();
  const connection = await mysql.createConnection({ uri: url, connectTimeout: 1_000 }).catch(() => null);
  await connection?.end();
  return connection ? url : null;
}
