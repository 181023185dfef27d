/** Progress in plain lines. */
export const say = (line) => console.log(line);

/** Something the person who typed the command has to know and act on; not a fault of the program. */
export class CannotStart extends Error {}

/** Runs a command's whole work; what it cannot do is said in words, without a stack trace. */
export async function runCommand(work) {
  try {
    await work();
  } catch (error) {
    if (error?.code === "ENOSPC") console.error("\nThe disk is full. Free some space and run the command again; nothing is lost.");
    else if (error instanceof CannotStart || error?.name === "ConfigError") console.error(`\n${error.message}`);
    else console.error(error);
    process.exitCode = 1;
  }
}
