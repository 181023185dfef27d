import { spawnSync } from "node:child_process";
import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync, writeFileSync } from "node:fs";
import path from "node:path";
import { CannotStart, say } from "./say.mjs";
import { ROOT } from "./packages.mjs";

/** What a build is made from. */
const SOURCES = [
  "app", "api-spec", "lib", "db", "public", "instrumentation.ts", "proxy.ts", "mdx-components.tsx",
  "next.config.mjs", "tailwind.config.ts", "postcss.config.mjs", "tsconfig.json", "package-lock.json",
];

function filesIn(entry: string): string[] {
  const full = path.join(ROOT, entry);
  if (!existsSync(full)) return [];
  const children = readdirSync(path.dirname(full), { withFileTypes: true }).find((child) => child.name === path.basename(full));
  if (!children?.isDirectory()) return [entry];
  return readdirSync(full, { recursive: true, withFileTypes: true })
    .filter((child) => child.isFile())
    .map((child) => path.relative(ROOT, path.join(child.parentPath, child.name)))
    .sort();
}

function fingerprint(): string {
  const hash = createHash("sha256").update(process.version);
  for (const file of SOURCES.flatMap(filesIn)) hash.update(file).update("\0").update(readFileSync(path.join(ROOT, file)));
  return hash.digest("hex");
}

/** Builds the application into `distDir`, unless what is there was built from the very same files. */
export function ensureBuild(distDir: string, environment: NodeJS.ProcessEnv): void {
  const stamp = path.join(ROOT, distDir, "averduct-sources");
  const now = fingerprint();
  if (existsSync(stamp) && readFileSync(stamp, "utf8") === now) return;
  say("Building (about a minute) …");
  const { status, stdout, stderr } = spawnSync(process.execPath, [path.join(ROOT, "node_modules/next/dist/bin/next"), "build"], {
    cwd: ROOT,
    encoding: "utf8",
    maxBuffer: 64 * 1024 ** 2,
    env: { ...environment, NODE_ENV: "production", AVERDUCT_DIST_DIR: distDir, NEXT_TELEMETRY_DISABLED: "1" },
  });
  if (status !== 0) throw new CannotStart(`The build failed:\n${stdout}${stderr}`);
  writeFileSync(stamp, now);
}
