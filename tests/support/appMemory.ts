import { readdirSync, readFileSync } from "node:fs";

const read = (pid: string, file: string): string => {
  try {
    return readFileSync(`/proc/${pid}/${file}`, "utf8");
  } catch {
    // The process has ended since the folder was listed.
    return "";
  }
};

/** What the running application's process holds in memory, in MiB. It is a child of the process that started the tests, as the one that runs this is. */
export function appMemory(): number {
  const statuses = readdirSync("/proc").filter((name) => /^\d+$/.test(name) && read(name, "cmdline").includes("lib/launch/serve.ts")).map((pid) => read(pid, "status"));
  const ours = statuses.find((status) => status.includes(`PPid:\t${process.ppid}\n`));
  if (!ours) throw new Error("the application's process was not found");
  return Number(/VmRSS:\s+(\d+)/.exec(ours)![1]) / 1024;
}
