import { setTimeout as pause } from "node:timers/promises";
import { database } from "./connection";

const PATIENCE_MS = 1_000;

/** Whether the database answers within a second. */
export async function isDatabaseReady(): Promise<boolean> {
  const answered = database().raw("SELECT 1").then(() => true, () => false);
  return Promise.race([answered, pause(PATIENCE_MS, false, { ref: false })]);
}
