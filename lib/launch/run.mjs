// Runs one of the project's commands, written in TypeScript: node lib/launch/run.mjs <file> [arguments]
import path from "node:path";
import { pathToFileURL } from "node:url";
import { ensurePackages, ROOT } from "./packages.mjs";
import { runCommand } from "./say.mjs";

await runCommand(async () => {
  ensurePackages();
  const { register } = await import("tsx/esm/api");
  register();
  const [file, ...commandArguments] = process.argv.slice(2);
  const { main } = await import(pathToFileURL(path.join(ROOT, file)).href);
  await main(commandArguments);
});
