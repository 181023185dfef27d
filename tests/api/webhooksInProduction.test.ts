import { randomBytes } from "node:crypto";
import { mkdtempSync, rmSync } from "node:fs";
import { createServer, type AddressInfo } from "node:net";
import os from "node:os";
import path from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { prepareDatabase } from "@/db/prepare";
import { startPrivateServer, type PrivateServer } from "@/db/privateServer";
import { startApp, type AppProcess } from "@/lib/launch/appProcess";
import { testDatabase } from "../support/accounts";
import { freePort } from "../support/freePort";
import { deliveriesWhen, happen, makeEndpoint, partner } from "../support/webhooks";

/** An installation of its own, in production: other workers would deliver by the rules of a local one. */
describe("webhooks in production", () => {
  const folder = mkdtempSync(path.join(os.tmpdir(), "averduct-webhooks-"));
  let server: PrivateServer;
  let app: AppProcess;
  let connections = 0;
  const listener = createServer((socket) => {
    connections += 1;
    socket.destroy();
  });

  beforeAll(async () => {
    server = await startPrivateServer(folder);
    await prepareDatabase(server.url);
    const port = String(await freePort());
    process.env.DATABASE_URL = server.url;
    process.env.AVERDUCT_TEST_URL = `http://localhost:${port}`;
    app = await startApp({
      ...process.env, NODE_ENV: "production", AVERDUCT_MODE: "production", AVERDUCT_SECRET: randomBytes(32).toString("hex"), AVERDUCT_DIST_DIR: ".next-test", HOST: "127.0.0.1", PORT: port, LOG_LEVEL: "warn",
    });
    await new Promise<void>((resolve) => listener.listen(0, resolve));
  });
  afterAll(async () => {
    await testDatabase().destroy();
    await app.stop();
    await server.stop();
    rmSync(folder, { recursive: true, force: true });
    listener.close();
  });

  it.each(["http://hooks.example/", "https://127.0.0.1/", "https://[::ffff:7f00:1]/", "https://192.168.1.20:8443/"])("do not go to %s", async (url) => {
    const us = await partner();
    const { body } = await us.call("post", "/webhook-endpoints", { url, eventTypes: ["traverse.issued"] }).expect(422);
    expect(body.errors).toMatchObject([{ pointer: "/url", code: "forbidden_target" }]);
    const { id } = await makeEndpoint(us, "https://hooks.example/");
    await us.call("patch", `/webhook-endpoints/${id}`, { url }).expect(422);
  });

  it("do not go to this machine by way of a name", async () => {
    const us = await partner();
    const { id } = await makeEndpoint(us, `https://localhost:${(listener.address() as AddressInfo).port}/`);
    await happen(us);
    const [one] = await deliveriesWhen(us, id, ([first]) => first?.attempts.length === 1);
    expect(one).toMatchObject({ status: "pending", attempts: [{ status: null, error: "The name resolves to a private or special address." }] });
    expect(connections).toBe(0);
  });

  it("do not go where a URL in the database was changed to", async () => {
    const us = await partner();
    const { id } = await makeEndpoint(us, "https://hooks.example/");
    await testDatabase()("webhook_endpoints").where({ id }).update({ url: `http://127.0.0.1:${(listener.address() as AddressInfo).port}/` });
    await happen(us);
    const [one] = await deliveriesWhen(us, id, ([first]) => first?.attempts.length === 1);
    expect(one!.attempts).toMatchObject([{ status: null, error: "The URL must use https." }]);
    expect(connections).toBe(0);
  });
});
