import type * as FileSystem from "node:fs";
import { mkdtempSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterEach, describe, expect, it, vi } from "vitest";

const MISSING = { file: "/nowhere/mariadbd", packageName: "mariadb-server-core", purpose: "the database" };

/** A PATH with nothing on it but these programs, which do nothing and succeed or fail. */
function onlyPrograms(programs: Record<string, number>): void {
  const folder = mkdtempSync(path.join(tmpdir(), "averduct-path-"));
  for (const [name, status] of Object.entries(programs)) writeFileSync(path.join(folder, name), `#!/bin/sh\nexit ${status}\n`, { mode: 0o755 });
  vi.stubEnv("PATH", folder);
}

afterEach(() => {
  vi.unstubAllEnvs();
  vi.restoreAllMocks();
  vi.doUnmock("node:fs");
  vi.resetModules();
});

describe("a start that cannot be", () => {
  it("says what to have installed, where this account may not", async () => {
    const { ensureDebianProgram } = await import("@/lib/launch/debian");
    onlyPrograms({ "apt-get": 0 });
    vi.spyOn(process, "getuid").mockReturnValue(1000);
    expect(() => ensureDebianProgram(MISSING)).toThrow(/this account may not install it.*as root:\s+apt-get update && apt-get install .*mariadb-server-core/s);
  });

  it("says what else would do, where there is no Debian", async () => {
    const { ensureDebianProgram } = await import("@/lib/launch/debian");
    onlyPrograms({});
    expect(() => ensureDebianProgram(MISSING)).toThrow(/not a Debian system. Install MariaDB 10.11 or later and set DATABASE_URL/);
  });

  it("says so where the package does not come", async () => {
    const { ensureDebianProgram } = await import("@/lib/launch/debian");
    onlyPrograms({ "apt-get": 0 });
    vi.spyOn(process, "getuid").mockReturnValue(0);
    expect(() => ensureDebianProgram(MISSING)).toThrow(/could not be installed.*Run it by hand/s);
  });

  it("says how much room is missing on a full disk, before npm is called", async () => {
    vi.doMock("node:fs", async (original) => ({ ...(await original<typeof FileSystem>()), existsSync: () => false, statfsSync: () => ({ bavail: 25_600, bsize: 4_096 }) }));
    const { ensurePackages } = await import("@/lib/launch/packages.mjs");
    expect(() => ensurePackages()).toThrow(/about 2 GiB.*100 MiB are free. Make room/);
  });
});
