// The one test command. Only what Node.js itself brings may be imported before the packages are there.
import { ensurePackages } from "./packages.mjs";
import { runCommand } from "./say.mjs";

await runCommand(async () => {
  ensurePackages();
  const { register } = await import("tsx/esm/api");
  register();
  const { runTests } = await import("./test.ts");
  await runTests(process.argv.slice(2));
});
