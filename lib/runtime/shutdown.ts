import { processWide } from "./processWide";

type Task = () => Promise<void>;
const tasks = (): Map<string, Task> => processWide("shutdown", () => new Map<string, Task>());

/** Has something done before the process ends: a buffer flushed, a pool closed. Later registrations run first. */
export function onShutdown(name: string, task: Task): void {
  tasks().set(name, task);
}

/** Runs every registered task, the latest first; one that fails does not keep the others from running. */
export async function runShutdownTasks(report: (name: string, error: unknown) => void): Promise<void> {
  for (const [name, task] of [...tasks()].reverse()) {
    await task().catch((error: unknown) => report(name, error));
  }
}
