import { spawn, type ChildProcess } from "node:child_process";
import path from "node:path";
import { CannotStart } from "./say.mjs";
import { ROOT } from "./packages.mjs";

export interface AppProcess {
  child: ChildProcess;
  ended: Promise<number | null>;
  stop(): Promise<void>;
}

/** Starts the application server as a process of its own and waits until it answers. */
export async function startApp(environment: NodeJS.ProcessEnv): Promise<AppProcess> {
  const child = spawn(process.execPath, ["--import", "tsx", path.join(ROOT, "lib/launch/serve.ts")], {
    cwd: ROOT,
    env: environment,
    stdio: ["ignore", "inherit", "inherit", "ipc"],
  });
  const ended = new Promise<number | null>((resolve) => child.once("exit", (code) => resolve(code)));
  const ready = new Promise<true>((resolve) => child.once("message", () => resolve(true)));
  if ((await Promise.race([ready, ended])) !== true) throw new CannotStart("The application did not start; its message is above.");
  return {
    child,
    ended,
    stop: async () => {
      child.kill("SIGTERM");
      await ended;
    },
  };
}
