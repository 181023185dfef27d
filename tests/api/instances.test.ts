import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { startApp, type AppProcess } from "@/lib/launch/appProcess";
import { makeKey, makeOrganisation, testDatabase } from "../support/accounts";
import { ROUND_TRAVERSE } from "../support/api";
import { freePort } from "../support/freePort";

const environment = async (): Promise<NodeJS.ProcessEnv> => ({
  ...process.env, NODE_ENV: "production", AVERDUCT_DIST_DIR: ".next-test", HOST: "127.0.0.1", PORT: String(await freePort()), LOG_LEVEL: "warn",
});

const airflow = (port: string, key: string): Promise<number> =>
  fetch(`http://127.0.0.1:${port}/api/v1/calculations/airflow`, {
    method: "POST", body: JSON.stringify(ROUND_TRAVERSE), headers: { "Content-Type": "application/json", Authorization: `Bearer ${key}` },
  }).then(({ status }) => status);

describe("two instances on one database", () => {
  let apps: AppProcess[];
  let ports: string[];
  beforeAll(async () => {
    const environments = [await environment(), await environment()];
    ports = environments.map(({ PORT }) => PORT!);
    apps = await Promise.all(environments.map(startApp));
  });
  afterAll(() => Promise.all(apps.map((app) => app.stop())));

  it("hold a month's quota together", async () => {
    const { text } = await makeKey({ organisationId: await makeOrganisation({ monthlyRequests: 200 }) });
    const statuses: number[] = [];
    for (let round = 0; round < 15; round += 1) statuses.push(...(await Promise.all(Array.from({ length: 20 }, (_, index) => airflow(ports[index % 2]!, text)))));
    const passed = statuses.filter((status) => status === 200).length;
    expect(Math.abs(passed - 200)).toBeLessThanOrEqual(10);
    expect(statuses.filter((status) => status === 429).length).toBe(300 - passed);
  });

  it("both refuse a key within 5 s of its revocation", async () => {
    const { id, text } = await makeKey();
    expect(await Promise.all(ports.map((port) => airflow(port, text)))).toEqual([200, 200]);
    await testDatabase()("api_keys").where({ id }).update({ revoked_at: new Date() });
    await new Promise((resolve) => setTimeout(resolve, 4_500));
    expect(await Promise.all(ports.map((port) => airflow(port, text)))).toEqual([401, 401]);
  });
});

describe("a stop", () => {
  it("writes the usage that was only counted, and gives back the quota that was only held", async () => {
    const settings = await environment();
    const app = await startApp(settings);
    const { text, organisationId } = await makeKey({ organisationId: await makeOrganisation({ monthlyRequests: 100_000 }) });
    for (let call = 0; call < 7; call += 1) expect(await airflow(settings.PORT!, text)).toBe(200);
    await app.stop();
    const { sum } = (await testDatabase()("usage_minutes").where({ organisation_id: organisationId }).sum({ sum: "requests" }).first())!;
    expect(Number(sum)).toBe(7);
    const [limit] = await testDatabase()("rate_limits").where("key", "like", `%quota:${organisationId}:%`);
    expect(limit.points).toBe(7);
  });
});
