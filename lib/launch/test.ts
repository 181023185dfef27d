import { spawnSync } from "node:child_process";
import path from "node:path";
import { CannotStart, say } from "./say.mjs";
import { CHROMIUM, ensureDebianProgram, MARIADB } from "./debian";
import { ensureBuild } from "./build";
import { ROOT } from "./packages.mjs";

const TEST_DIST_DIR = ".next-test";
const environment: NodeJS.ProcessEnv = { ...process.env, NEXT_TELEMETRY_DISABLED: "1" };

function run(title: string, ...command: [string, ...string[]]): void {
  say(`${title} …`);
  const [script, ...args] = command;
  const { status } = spawnSync(process.execPath, [path.join(ROOT, "node_modules", script), ...args], { cwd: ROOT, stdio: "inherit", env: environment });
  if (status !== 0) throw new CannotStart(`${title}: failed; see above.`);
}

/** Everything that must hold: lint, types, engine, and the real application on a real database in a real browser. */
export async function runTests(filters: string[]): Promise<void> {
  ensureDebianProgram(MARIADB);
  ensureDebianProgram(CHROMIUM);
  if (filters.length === 0) {
    run("Lint", "eslint/bin/eslint.js", ".", "--max-warnings=0");
    run("Route types", "next/dist/bin/next", "typegen");
    run("Types", "typescript/bin/tsc", "--noEmit");
  }
  ensureBuild(TEST_DIST_DIR, environment);
  run("Tests", "vitest/vitest.mjs", "run", ...filters);
}
