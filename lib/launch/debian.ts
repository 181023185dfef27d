import { spawnSync } from "node:child_process";
import { existsSync } from "node:fs";
import { CannotStart, say } from "./say.mjs";

/** A program from one of Debian's packages. */
export interface DebianProgram {
  /** Where the package puts the program. */
  file: string;
  packageName: string;
  purpose: string;
}

export const MARIADB: DebianProgram = { file: "/usr/sbin/mariadbd", packageName: "mariadb-server-core", purpose: "the database" };
export const CHROMIUM: DebianProgram = { file: "/usr/bin/chromium", packageName: "chromium", purpose: "the browser tests" };

const canRun = (command: string, ...args: string[]): boolean => spawnSync(command, args, { stdio: "ignore" }).status === 0;

/** What stands before a command to run it as root; null where this account may not. */
function asRoot(): string[] | null {
  if (process.getuid?.() === 0) return [];
  return canRun("sudo", "--non-interactive", "true") ? ["sudo", "--non-interactive"] : null;
}

function run(command: string[]): boolean {
  const [program, ...args] = command as [string, ...string[]];
  const { status } = spawnSync(program, args, { stdio: ["ignore", "ignore", "inherit"], env: { ...process.env, DEBIAN_FRONTEND: "noninteractive" } });
  return status === 0;
}

/** Installs a program from Debian's packages when it is missing. */
export function ensureDebianProgram({ file, packageName, purpose }: DebianProgram): void {
  if (existsSync(file)) return;
  const byHand = `apt-get update && apt-get install --yes --no-install-recommends ${packageName}`;
  if (!canRun("apt-get", "--version")) {
    throw new CannotStart(`${file} is missing (${purpose}) and this is not a Debian system. Install MariaDB 10.11 or later and set DATABASE_URL, or use Debian.`);
  }
  const root = asRoot();
  if (!root) throw new CannotStart(`${file} is missing (${purpose}) and this account may not install it. Have somebody run, once, as root:\n  ${byHand}`);

  say(`Installing ${packageName} from Debian's packages (${purpose}) …`);
  const installed = run([...root, "apt-get", "update", "-qq"]) && run([...root, "apt-get", "install", "-qq", "--yes", "--no-install-recommends", packageName]);
  if (!installed || !existsSync(file)) throw new CannotStart(`${packageName} could not be installed; apt-get's message is above. Run it by hand, then try again:\n  ${byHand}`);
}
