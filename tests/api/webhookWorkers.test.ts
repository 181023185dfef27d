import { afterAll, beforeAll, beforeEach, describe, expect, it } from "vitest";
import { newId } from "@/lib/ids/newId";
import { calibrationDueEvents } from "@/lib/webhooks/calibrationDue";
import { dispatchEvents, takeDeliveries } from "@/lib/webhooks/queue";
import { recordEvent } from "@/lib/webhooks/recordEvent";
import { settle } from "@/lib/webhooks/settle";
import { WebhookWorker } from "@/lib/webhooks/worker";
import { testDatabase } from "../support/accounts";
import { Receiver, until } from "../support/receiver";
import { deliveriesWhen, happen, makeEndpoint, partner } from "../support/webhooks";

const seconds = (count: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, count * 1_000));

describe("workers on one database", () => {
  let receiver: Receiver;
  beforeAll(async () => void (receiver = await Receiver.start()));
  beforeEach(() => {
    receiver.received.length = 0;
    receiver.answer = (response) => response.writeHead(204).end();
  });
  afterAll(() => receiver.stop());

  it("deliver each event to each endpoint once, and never two at a time the same", async () => {
    const us = await partner();
    const endpoints = await Promise.all(["/a", "/b", "/c"].map((path) => makeEndpoint(us, receiver.url(path))));
    const open = new Set<string>();
    let overlaps = 0;
    receiver.answer = (response, { path, headers }) => {
      const key = `${path} ${headers["webhook-id"]}`;
      if (open.has(key)) overlaps += 1;
      open.add(key);
      setTimeout(() => {
        open.delete(key);
        response.writeHead(204).end();
      }, 20);
    };
    // Beside the application's own.
    const workers = [new WebhookWorker(testDatabase(), "any"), new WebhookWorker(testDatabase(), "any")];
    try {
      // All seen at once, by all workers.
      await testDatabase().transaction(async (db) => {
        for (let index = 0; index < 100; index += 1) await recordEvent(db, us.realm, "traverse.issued", { id: index });
      });
      const events: string[] = await testDatabase()("events").where({ organisation_id: us.realm.organisationId }).pluck("id");
      await until("all deliveries", async () => {
        const [row] = await testDatabase()("deliveries").where({ organisation_id: us.realm.organisationId, status: "delivered" }).count({ count: "*" });
        return Number(row!["count"]) === 300;
      }, 30_000);
      const seen = receiver.received.map(({ path, headers }) => `${path} ${headers["webhook-id"]}`);
      expect(seen.sort()).toEqual(["/a", "/b", "/c"].flatMap((path) => events.map((event) => `${path} ${event}`)).sort());
      expect(overlaps).toBe(0);
      const attempts = await testDatabase()("delivery_attempts as t").join("deliveries as d", "d.id", "t.delivery_id").whereIn("d.webhook_endpoint_id", endpoints.map(({ id }) => id));
      expect(attempts).toHaveLength(300);
    } finally {
      await Promise.all(workers.map((worker) => worker.stop()));
    }
  });

  it("make one delivery of an event that several find at the same time", async () => {
    const us = await partner();
    await makeEndpoint(us, receiver.url("/once"));
    for (let round = 0; round < 10; round += 1) {
      await testDatabase().transaction(async (db) => {
        for (let index = 0; index < 20; index += 1) await recordEvent(db, us.realm, "traverse.issued", { id: index });
      });
      await Promise.all([1, 2, 3].map(() => dispatchEvents(testDatabase())));
    }
    const count = async (status: string) => Number((await testDatabase()("deliveries").where({ organisation_id: us.realm.organisationId, status }).count({ count: "*" }))[0]!["count"]);
    await until("all to be made and delivered", async () => (await count("delivered")) >= 200 && (await count("pending")) === 0);
    expect(await count("delivered")).toBe(200);
  });

  it("settle what is under way before they stop", async () => {
    const us = await partner();
    const { id } = await makeEndpoint(us, receiver.url("/slow"));
    receiver.answer = (response) => void setTimeout(() => response.writeHead(204).end(), 1_500);
    const workers = [new WebhookWorker(testDatabase(), "any"), new WebhookWorker(testDatabase(), "any")];
    for (let index = 0; index < 10; index += 1) await happen(us);
    await until("something under way", () => receiver.received.length >= 8);
    await Promise.all(workers.map((worker) => worker.stop()));
    // What the stopped ones had begun was not left to its lease.
    await deliveriesWhen(us, id, (all) => all.length === 10 && all.every(({ status, attempts }) => status === "delivered" && attempts.length === 1));
    expect(receiver.received).toHaveLength(10);
  });

  it("do not let a slow endpoint hold up another", async () => {
    const us = await partner();
    const slow = await makeEndpoint(us, receiver.url("/slow"), ["traverse.issued"]);
    const quick = await makeEndpoint(us, receiver.url("/quick"), ["traverse.voided"]);
    receiver.answer = (response, { path }) => void (path === "/quick" && response.writeHead(204).end());
    for (let index = 0; index < 50; index += 1) await happen(us, "traverse.issued");
    await until("the slow one to be busy", () => receiver.received.length >= 4);
    const start = performance.now();
    await happen(us, "traverse.voided");
    await deliveriesWhen(us, quick.id, ([one]) => one?.status === "delivered");
    expect(performance.now() - start).toBeLessThan(2_500);
    await seconds(1);
    expect(receiver.received.filter(({ path }) => path === "/slow")).toHaveLength(4);
    await us.call("delete", `/webhook-endpoints/${slow.id}`).expect(204);
  });

  it("leave what a dead one had taken until its lease is over, and do not let it speak afterwards", async () => {
    const us = await partner();
    const { id } = await makeEndpoint(us, receiver.url("/later"));
    // One that waits, so that this test can take it before the application does.
    const waiting = newId("dlv");
    const eventId = await happen(us, "traverse.voided");
    await until("its dispatch", async () => (await testDatabase()("events").where({ id: eventId }).first()).dispatched_at);
    const taken = await testDatabase().transaction(async (db) => {
      await db("deliveries").insert({ id: waiting, organisation_id: us.realm.organisationId, environment: us.realm.environment, event_id: eventId, webhook_endpoint_id: id, next_attempt_at: new Date(Date.now() - 1_000) });
      return takeDeliveries(db, id, 1);
    });
    expect(taken).toMatchObject([{ id: waiting, attempt: 1 }]);
    await seconds(2);
    expect(receiver.received).toEqual([]);
    const [leased] = await deliveriesWhen(us, id, (all) => all.length === 1);
    const lease = Date.parse(leased!.nextAttemptAt!) - Date.now();
    expect(lease).toBeGreaterThan(50_000);
    expect(lease).toBeLessThan(60_000);

    receiver.answer = (response) => response.writeHead(500).end();
    await testDatabase()("deliveries").where({ id: waiting }).update({ next_attempt_at: new Date(Date.now() - 1_000) });
    const [second] = await deliveriesWhen(us, id, ([one]) => one?.attempts.length === 1);
    await testDatabase().transaction((db) => settle(db, taken[0]!, { status: null, error: "late", milliseconds: 1 }));
    const [after] = await deliveriesWhen(us, id, ([one]) => one?.attempts.length === 2);
    expect(after).toMatchObject({ status: "pending", nextAttemptAt: second!.nextAttemptAt });
  });

  it("count a secret that cannot be read as a failed attempt", async () => {
    const us = await partner();
    const { id } = await makeEndpoint(us, receiver.url("/unreadable"));
    await testDatabase()("webhook_endpoints").where({ id }).update({ secret_encrypted: "c2VhbGVkIHVuZGVyIGFub3RoZXIgc2VjcmV0IHRoYW4gdGhpcw" });
    await happen(us);
    const [one] = await deliveriesWhen(us, id, ([first]) => first?.attempts.length === 1);
    expect(one).toMatchObject({ status: "pending", attempts: [{ status: null, error: "The endpoint's secret could not be read." }] });
    expect(receiver.received).toEqual([]);
  });
});

describe("calibrations that are due", () => {
  it("are told of once, by whichever instance comes first", async () => {
    const us = await partner();
    const { realm } = us;
    const inDays = (days: number): string => new Date(Date.now() + days * 86_400_000).toISOString().slice(0, 10);
    const add = async (due: string | null): Promise<string> => {
      const id = newId("ins");
      await testDatabase()("instruments").insert({ id, organisation_id: realm.organisationId, environment: realm.environment, name: "Manometer", serial_number: "7", properties: "{}", calibration_due: due });
      return id;
    };
    const told = [await add(inDays(14)), await add(inDays(0)), await add(inDays(-400))];
    const untold = [await add(inDays(15)), await add(null)];
    await Promise.all([1, 2, 3].map(() => calibrationDueEvents(testDatabase())));
    await calibrationDueEvents(testDatabase());
    const { items } = (await us.call("get", "/events?type=instrument.calibration_due").expect(200)).body;
    expect(items.map(({ data }: { data: { instrumentId: string } }) => data.instrumentId).sort()).toEqual([...told].sort());
    expect(items).toContainEqual(expect.objectContaining({ data: { instrumentId: told[0], name: "Manometer", serialNumber: "7", calibrationDue: inDays(14) } }));
    // A new calibration that falls due is told of again.
    await testDatabase()("instruments").where({ id: untold[0] }).update({ calibration_due: inDays(3), calibration_due_told_at: null });
    await calibrationDueEvents(testDatabase());
    expect((await us.call("get", "/events").expect(200)).body.items).toHaveLength(4);
  });
});
