import { spawnSync } from "node:child_process";
import { describe, expect, it } from "vitest";
import { testDatabase } from "../support/accounts";
import { calculate, ROUND_TRAVERSE } from "../support/api";

const run = (...options: string[]) => spawnSync(process.execPath, ["lib/launch/run.mjs", "lib/launch/createKey.ts", ...options], { encoding: "utf8" });

describe("a key made from the command line", () => {
  it("is printed alone, and calculates", async () => {
    const { stdout, status } = run("--organisation", "Command Line Test", "--name", "first call", "--days", "2");
    expect(status).toBe(0);
    const key = stdout.trim();
    expect(key).toMatch(/^averduct_sandbox_\S+$/);
    await calculate("airflow", key, ROUND_TRAVERSE).expect(200);
    const row = await testDatabase()("api_keys as k").join("organisations as o", "o.id", "k.organisation_id").where("o.name", "Command Line Test").first("k.name", "k.expires_at", "k.scopes");
    expect(row).toMatchObject({ name: "first call", scopes: ["calculations"] });
    expect(row.expires_at.getTime() - Date.now()).toBeGreaterThan(47 * 3_600_000);
  });

  it.each([
    [["--organisation", "Command Line Test", "--scopes", "everything"], "No such scope: everything"],
    [["--organisation", "Command Line Test", "--networks", "10.0.0.0"], '"10.0.0.0" is not a network in CIDR form'],
    [["--organisation", "Command Line Test", "--days", "soon"], "--days is a number above 0"],
    [["--organization", "x"], "--organisation NAME"],
  ])("is refused in words, without a trace: %j", (options, words) => {
    const { stdout, stderr, status } = run(...options);
    expect(status).toBe(1);
    expect(stdout + stderr).toContain(words);
    expect(stdout + stderr).not.toMatch(/\n\s+at /);
  });

  it("says how to use it where nothing is named", () => expect(run().stdout).toContain("--organisation NAME"));
});
