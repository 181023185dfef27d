import { Webhook } from "standardwebhooks";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { api } from "../support/api";
import { arrange, partner, SUPPLY_MAIN, type Partner } from "../support/records";
import { Receiver, until } from "../support/receiver";

/** A photograph no larger than a pixel. */
const PHOTO = Buffer.from("iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAYAAAAfFcSJAAAADUlEQVR42mNk+M9QDwADhgGAWjR9awAAAABJRU5ErkJggg==", "base64");

describe("a partner application's whole traverse work, through HTTP alone", () => {
  let app: Partner;
  let receiver: Receiver;
  let secret: string;
  let references: { projectId: string; instrumentId: string };
  let id: string;
  let etag: string;
  beforeAll(async () => {
    app = await partner({ environment: "production" });
    receiver = await Receiver.start();
  });
  afterAll(() => receiver.stop());

  it("asks to be told, and makes a project and an instrument with its calibration", async () => {
    secret = (await app.send("post", "/webhook-endpoints", { url: receiver.url(), eventTypes: ["traverse.issued", "traverse.voided"] }).expect(201)).body.secret;
    references = await arrange(app);
  });

  it("plans where to drill and how deep to read", async () => {
    const { duct, layout } = SUPPLY_MAIN;
    const { body } = await app.send("post", "/calculations/traverse-plan", { duct, layout, enterFrom: "top" }).expect(200);
    expect(body.holes.map(({ points }: { points: unknown[] }) => points.length)).toEqual([5, 5, 5, 5, 5]);
  });

  it("stores a draft, and the readings in two sittings", async () => {
    const { readings, ...rest } = SUPPLY_MAIN;
    const draft = await app.send("post", "/traverses", { ...rest, ...references, holes: { count: 5, sealed: false } }).expect(201);
    id = draft.body.id;
    const first = await app.send("patch", `/traverses/${id}`, { readings: { ...readings, lines: readings.lines.slice(0, 2) } }, { "If-Match": draft.headers["etag"]! }).expect(200);
    const second = await app.send("patch", `/traverses/${id}`, { readings }, { "If-Match": first.headers["etag"]! }).expect(200);
    expect(second.body.result.statistics.count).toBe(25);
    etag = second.headers["etag"]!;
  });

  it("attaches a photograph", async () => {
    const answer = await app.send("post", `/traverses/${id}/attachments`).field("caption", "Holes plugged").attach("file", PHOTO, { filename: "holes.png", contentType: "image/png" }).expect(201);
    expect(answer.body).toMatchObject({ mediaType: "image/png", caption: "Holes plugged" });
    const image = await api().get(new URL(answer.body.url).pathname + new URL(answer.body.url).search).expect(200);
    expect(image.body).toEqual(PHOTO);
  });

  it("is told what is missing, seals the holes, and issues", async () => {
    const { body } = await app.send("post", `/traverses/${id}/issue`).expect(409);
    expect(body.errors.map(({ code }: { code: string }) => code)).toEqual(["holes_not_sealed"]);
    await app.send("patch", `/traverses/${id}`, { holes: SUPPLY_MAIN.holes }, { "If-Match": etag }).expect(200);
    expect((await app.send("post", `/traverses/${id}/issue`).expect(200)).body.status).toBe("issued");
  });

  it("is told of it, signed", async () => {
    const told = await until("the delivery", () => receiver.received[0]);
    const payload = new Webhook(secret).verify(told.body, told.headers as Record<string, string>) as { type: string; data: { id: string } };
    expect(payload).toMatchObject({ type: "traverse.issued", data: { id } });
  });

  it("fetches the certificate, which leads to the page where anyone can check the record", async () => {
    const { body, headers } = await app.send("get", `/traverses/${id}/certificate.pdf`).buffer(true).expect(200);
    expect(headers["content-type"]).toBe("application/pdf");
    expect(body.subarray(0, 5).toString()).toBe("%PDF-");
    expect((await api().get(`/verify/${id}/certificate.pdf`).buffer(true).expect(200)).body).toEqual(body);
    expect((await api().get(`/verify/${id}`).expect(200)).text).toContain("The record is as it was signed");
    const signature = (await app.send("get", `/traverses/${id}/signature`)).body;
    expect((await api().post("/api/v1/verify").send({ jws: signature.jws, document: signature.document })).body).toMatchObject({ valid: true, record: { id, status: "issued" } });
  });

  it("revises it, and the old record says that it was superseded", async () => {
    const revision = (await app.send("post", `/traverses/${id}/revisions`).expect(201)).body;
    await app.send("patch", `/traverses/${revision.id}`, { notes: "Dry bulb corrected.", air: { ...SUPPLY_MAIN.air, dryBulb: { value: 61, unit: "degF" } } }).expect(200);
    await app.send("post", `/traverses/${revision.id}/issue`).expect(200);
    expect((await app.send("get", `/traverses/${id}`)).body).toMatchObject({ status: "superseded", supersededBy: revision.id });
    expect((await api().get(`/verify/${id}`)).text).toContain("A later revision stands in its place");
    expect((await until("the second delivery", () => receiver.received[1])).body).toContain(revision.id);
  });
});
