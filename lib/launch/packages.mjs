import { spawnSync } from "node:child_process";
import { createHash } from "node:crypto";
import { existsSync, readFileSync, statfsSync, writeFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import path from "node:path";
import { CannotStart, say } from "./say.mjs";

export const ROOT = fileURLToPath(new URL("../..", import.meta.url));
const NEEDED_NODE = [20, 19];
/** What packages, build and data take together on a first start, with room to spare. */
const NEEDED_BYTES = 2 * 1024 ** 3;

function requireNode() {
  const [major, minor] = process.versions.node.split(".").map(Number);
  if (major > NEEDED_NODE[0] || (major === NEEDED_NODE[0] && minor >= NEEDED_NODE[1])) return;
  throw new CannotStart(`Averduct needs Node.js ${NEEDED_NODE.join(".")} or later; this is ${process.versions.node}.`);
}

function requireSpace() {
  const { bavail, bsize } = statfsSync(ROOT);
  if (bavail * bsize >= NEEDED_BYTES) return;
  const free = Math.floor((bavail * bsize) / 1024 ** 2);
  throw new CannotStart(`Installing needs about 2 GiB on the disk that holds ${ROOT}; ${free} MiB are free. Make room and run the command again.`);
}

/** Installs npm's packages when they are missing or the lock file has changed since. */
export function ensurePackages() {
  requireNode();
  const lock = createHash("sha256").update(readFileSync(path.join(ROOT, "package-lock.json"))).digest("hex");
  const stamp = path.join(ROOT, "node_modules", ".installed-lock");
  if (existsSync(stamp) && readFileSync(stamp, "utf8") === lock) return;
  requireSpace();
  say("Installing packages (about a minute the first time) …");
  const { status } = spawnSync("npm", ["ci", "--no-audit", "--no-fund", "--loglevel=warn"], {
    cwd: ROOT,
    stdio: "inherit",
    env: { ...process.env, NODE_ENV: "development" },
  });
  if (status !== 0) throw new CannotStart("npm could not install the packages; its message is above. Check the connection to the npm registry and run the command again.");
  writeFileSync(stamp, lock);
}
