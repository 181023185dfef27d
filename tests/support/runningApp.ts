import { rmSync } from "node:fs";
import path from "node:path";
import { prepareDatabase } from "@/db/prepare";
import { startPrivateServer, stopLeftover } from "@/db/privateServer";
import { startApp } from "@/lib/launch/appProcess";
import { ROOT } from "@/lib/launch/packages.mjs";
import { freePort } from "./freePort";

/** Starts MariaDB and the built application on a folder and ports of their own, for all tests that need them. */
export default async function startRunningApp(): Promise<() => Promise<void>> {
  const folder = path.join(ROOT, ".data", "test");
  await stopLeftover(folder);
  rmSync(folder, { recursive: true, force: true });
  const database = await startPrivateServer(folder);
  await prepareDatabase(database.url);
  process.env.OBJECTS_FOLDER = path.join(folder, "objects");
  const port = await freePort();
  const url = `http://localhost:${port}`;
  const app = await startApp({
    ...process.env,
    NODE_ENV: "production",
    AVERDUCT_DIST_DIR: ".next-test",
    AVERDUCT_URL: url,
    DATABASE_URL: database.url,
    HOST: "127.0.0.1",
    PORT: String(port),
    LOG_LEVEL: "warn",
  });
  process.env.AVERDUCT_TEST_URL = url;
  process.env.DATABASE_URL = database.url;
  return async () => {
    await app.stop();
    await database.stop();
    rmSync(folder, { recursive: true, force: true });
  };
}
