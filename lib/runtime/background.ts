import { log } from "./log";
import { processWide } from "./processWide";
import { onShutdown } from "./shutdown";

const underway = (): Set<Promise<void>> =>
  processWide("background", () => {
    const works = new Set<Promise<void>>();
    onShutdown("background", async () => void (await Promise.all(works)));
    return works;
  });

/**
 * Does something that an answer does not wait for, so that neither its duration nor its failure shows in the answer.
 * A failure is logged; the process does not end before the work has.
 */
export function inBackground(name: string, work: () => Promise<void>): void {
  const works = underway();
  const running = work()
    .catch((error: unknown) => log().error({ err: error, name }, "work in the background failed"))
    .finally(() => works.delete(running));
  works.add(running);
}
