import { randomUUID } from "node:crypto";
import { beforeAll, describe, expect, it } from "vitest";
import { OPERATIONS } from "@/api-spec/registry";
import { testDatabase } from "../support/accounts";
import { arrange, issuedRecord, partner, SUPPLY_MAIN, type Partner } from "../support/records";

describe("a draft", () => {
  let app: Partner;
  let references: { projectId: string; instrumentId: string };
  beforeAll(async () => {
    app = await partner();
    references = await arrange(app);
  });

  it("begins with its project alone, and fills in several sittings", async () => {
    const { body, headers } = await app.send("post", "/traverses", { projectId: references.projectId }).expect(201);
    expect(body).toMatchObject({ status: "draft", revision: 1, result: null, duct: null });
    expect(headers["location"]).toBe(`/api/v1/traverses/${body.id}`);
    const { lines } = SUPPLY_MAIN.readings;
    await app.send("patch", `/traverses/${body.id}`, { ...SUPPLY_MAIN, instrumentId: references.instrumentId, readings: { ...SUPPLY_MAIN.readings, lines: lines.slice(0, 3) } }).expect(200);
    const whole = await app.send("patch", `/traverses/${body.id}`, { readings: SUPPLY_MAIN.readings }).expect(200);
    expect(whole.body.result.airflow.actual.value).toBeGreaterThan(2_400);
    expect(whole.body.missingForIssue).toEqual([]);
    expect(whole.body.result.working).toBeUndefined();
    const read = await app.send("get", `/traverses/${body.id}?include=working`).expect(200);
    expect(read.body.result.working.length).toBeGreaterThan(10);
    expect(read.body.instrument).toMatchObject({ name: "Micromanometer 2", calibration: { certificateNumber: "SM-2213" } });
    const history = await app.send("get", `/traverses/${body.id}/history`).expect(200);
    expect(history.body.items.map(({ action }: { action: string }) => action)).toEqual(["created", "changed", "changed"]);
  });

  it("gives what the calculation gives", async () => {
    const { body } = await app.send("post", "/traverses", { ...SUPPLY_MAIN, ...references }).expect(201);
    const { duct, layout, readings, air, design } = SUPPLY_MAIN;
    const calculated = await app.send("post", "/calculations/airflow", { duct, layout, readings, air, design, instrument: { principle: "differential_pressure" } }).expect(200);
    expect(body.result).toEqual(calculated.body);
  });

  it("refuses what cannot be, with its place, and keeps what it had", async () => {
    const { body } = await app.send("post", "/traverses", { ...SUPPLY_MAIN, ...references }).expect(201);
    const refused = await app.send("patch", `/traverses/${body.id}`, { duct: { ...SUPPLY_MAIN.duct, wall: { lining: { value: 10, unit: "in" } } } }).expect(422);
    expect(refused.body.errors[0].pointer).toMatch(/^\/duct/);
    await app.send("patch", `/traverses/${body.id}`, { projectId: "prj_00000000000000000000000000" }).expect(422);
    expect((await app.send("get", `/traverses/${body.id}`)).body).toMatchObject({ duct: SUPPLY_MAIN.duct, projectId: references.projectId });
  });

  it("lists everything that is missing for issue at once", async () => {
    const { body } = await app.send("post", "/traverses", { projectId: references.projectId, duct: SUPPLY_MAIN.duct }).expect(201);
    const refused = await app.send("post", `/traverses/${body.id}/issue`).expect(409);
    expect(refused.body.type).toContain("not-ready-to-issue");
    expect(refused.body.errors.map(({ code }: { code: string }) => code)).toEqual(["no_result", "no_technician", "not_dated", "holes_unknown", "no_instrument"]);
    expect(body.missingForIssue).toEqual(refused.body.errors);
  });

  it("is not issued with an instrument out of calibration, unless a reason is given", async () => {
    const late = { ...SUPPLY_MAIN, ...references, takenAt: "2026-02-01T09:00:00Z" };
    const { body } = await app.send("post", "/traverses", late).expect(201);
    expect((await app.send("post", `/traverses/${body.id}/issue`).expect(409)).body.errors[0].code).toBe("not_calibrated");
    await app.send("patch", `/traverses/${body.id}`, { calibrationWaiver: { reason: "Compared with the reference manometer on site." } }).expect(200);
    await app.send("post", `/traverses/${body.id}/issue`).expect(200);
  });

  it("is deleted, and its project only when it holds none", async () => {
    const project = await app.send("post", "/projects", { name: "Short-lived" }).expect(201);
    const { body } = await app.send("post", "/traverses", { projectId: project.body.id }).expect(201);
    expect((await app.send("delete", `/projects/${project.body.id}`).expect(409)).body.type).toContain("still-in-use");
    await app.send("delete", `/traverses/${body.id}`).expect(204);
    await app.send("delete", `/projects/${project.body.id}`).expect(204);
    await app.send("get", `/projects/${project.body.id}`).expect(404);
  });
});

describe("an issued record", () => {
  let app: Partner;
  let id: string;
  beforeAll(async () => {
    app = await partner();
    id = await issuedRecord(app);
  });

  it("cannot be changed, deleted or issued again", async () => {
    expect((await app.send("patch", `/traverses/${id}`, { notes: "later" }).expect(409)).body.type).toContain("not-a-draft");
    await app.send("delete", `/traverses/${id}`).expect(409);
    await app.send("post", `/traverses/${id}/issue`).expect(409);
  });

  it("cannot be changed in the database either", async () => {
    const db = testDatabase();
    for (const change of [{ result: "{}" }, { input: "{}" }, { revision: 7 }, { status: "draft" }, { taken_at: new Date() }, { percent_of_design: 1 }]) {
      await expect(db("traverses").where({ id }).update(change)).rejects.toThrow("an issued traverse cannot be changed");
    }
    await expect(db("traverses").where({ id }).delete()).rejects.toThrow();
    await expect(db("issued_documents").where({ traverse_id: id }).update({ document: "{}" })).rejects.toThrow("cannot be changed");
    await expect(db("issued_documents").where({ traverse_id: id }).delete()).rejects.toThrow("cannot be deleted");
  });

  it("keeps its instrument and project as they were on the day", async () => {
    const before = await app.send("get", `/traverses/${id}`);
    await app.send("patch", `/instruments/${before.body.instrumentId}`, { name: "Renamed" }).expect(200);
    await app.send("patch", `/projects/${before.body.projectId}`, { name: "Renamed too" }).expect(200);
    const after = await app.send("get", `/traverses/${id}`);
    expect(after.body.instrument).toEqual(before.body.instrument);
    expect(JSON.parse((await app.send("get", `/traverses/${id}/signature`)).body.document).project.name).toBe("Marram Point Library");
  });

  it("is superseded by its revision, and only by one", async () => {
    const revision = await app.send("post", `/traverses/${id}/revisions`).expect(201);
    expect(revision.body).toMatchObject({ status: "draft", revision: 2, supersedes: id, readings: SUPPLY_MAIN.readings });
    expect((await app.send("post", `/traverses/${id}/revisions`).expect(409)).body.type).toContain("revision-open");
    await app.send("post", `/traverses/${revision.body.id}/issue`).expect(200);
    expect((await app.send("get", `/traverses/${id}`)).body).toMatchObject({ status: "superseded", supersededBy: revision.body.id });
    expect((await app.send("post", `/traverses/${id}/void`, { reason: "x" }).expect(409)).body.type).toContain("not-issued");
  });

  it("is voided with a reason", async () => {
    const record = await issuedRecord(app);
    await app.send("post", `/traverses/${record}/void`, {}).expect(422);
    const { body } = await app.send("post", `/traverses/${record}/void`, { reason: "Wrong duct." }).expect(200);
    expect(body).toMatchObject({ status: "void", voided: { reason: "Wrong duct." } });
    await app.send("post", `/traverses/${record}/void`, { reason: "Again" }).expect(409);
  });
});

describe("two at once", () => {
  let app: Partner;
  let references: { projectId: string; instrumentId: string };
  beforeAll(async () => {
    app = await partner();
    references = await arrange(app);
  });

  it("with one ETag: one wins, the other is told", async () => {
    const { body, headers } = await app.send("post", "/traverses", { ...SUPPLY_MAIN, ...references }).expect(201);
    const change = (notes: string) => app.send("patch", `/traverses/${body.id}`, { notes }, { "If-Match": headers["etag"]! });
    const answers = await Promise.all([change("one"), change("two")]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 412]);
    const winner = answers.find(({ status }) => status === 200)!;
    expect((await app.send("get", `/traverses/${body.id}`)).body.notes).toBe(winner.body.notes);
    expect(winner.headers["etag"]).toBe('"2"');
    await app.send("get", `/traverses/${body.id}`, undefined, { "If-None-Match": '"2"' }).expect(304);
  });

  it("with one Idempotency-Key: one record, equal answers; for another body it is refused", async () => {
    const key = randomUUID();
    const answers = await Promise.all(Array.from({ length: 5 }, () => app.send("post", "/traverses", { ...SUPPLY_MAIN, ...references, system: "ONCE" }, { "Idempotency-Key": key })));
    expect(answers.map(({ status }) => status)).toEqual([201, 201, 201, 201, 201]);
    expect(new Set(answers.map(({ text }) => text)).size).toBe(1);
    expect(answers.filter(({ headers }) => headers["idempotency-replayed"] === "true")).toHaveLength(4);
    expect((await app.send("get", "/traverses?system=ONCE")).body.items).toHaveLength(1);
    expect((await app.send("post", "/traverses", { projectId: references.projectId }, { "Idempotency-Key": key }).expect(422)).body.type).toContain("idempotency-key-reused");
  });

  it("with a fault: what was begun is undone whole, and the key is free again", async () => {
    const key = randomUUID();
    await app.send("post", "/traverses", { projectId: "prj_00000000000000000000000000" }, { "Idempotency-Key": key }).expect(422);
    await app.send("post", "/traverses", { projectId: references.projectId }, { "Idempotency-Key": key }).expect(201);
  });
});

describe("lists", () => {
  let app: Partner;
  let references: { projectId: string; instrumentId: string };
  beforeAll(async () => {
    app = await partner();
    references = await arrange(app);
    for (let day = 1; day <= 7; day += 1) {
      await app.send("post", "/traverses", { ...SUPPLY_MAIN, ...references, system: day % 2 ? "AHU-1" : "EF-3", takenAt: `2026-10-0${8 - day}T08:00:00Z`, design: { airflow: { value: day > 5 ? 1_000 : 2_600, unit: "ft3/min" } } }).expect(201);
    }
  });
  const list = async (query: string) => (await app.send("get", `/traverses?${query}`).expect(200)).body as { items: { id: string; takenAt: string; system: string; outsideTolerance: boolean }[]; next: string | null };

  it.each(["taken", "-taken", "created", "-created"])("page by keyset, each item once: %s", async (sort) => {
    const seen: string[] = [];
    for (let after = ""; ; ) {
      const { items, next } = await list(`sort=${sort}&limit=3${after && `&after=${after}`}`);
      seen.push(...items.map(({ takenAt }) => takenAt.slice(8, 10)));
      if (next === null) break;
      after = next;
    }
    const ascending = ["01", "02", "03", "04", "05", "06", "07"];
    expect(seen).toEqual(sort === "taken" || sort === "-created" ? ascending : [...ascending].reverse());
  });

  it("filter", async () => {
    expect((await list("system=EF-3")).items).toHaveLength(3);
    expect((await list("outsideTolerance=true")).items).toHaveLength(2);
    expect((await list("outsideTolerance=false")).items).toHaveLength(5);
    expect((await list("takenFrom=2026-10-02T00:00:00Z&takenBefore=2026-10-05T00:00:00Z")).items).toHaveLength(3);
    expect((await list(`projectId=${references.projectId}&instrumentId=${references.instrumentId}&status=draft`)).items).toHaveLength(7);
    expect((await list("status=issued")).items).toHaveLength(0);
  });

  it.each(["after=nonsense", "after=WyJ4IiwieSJd", "limit=0", "sort=size", "status=open", "colour=red"])("refuse with the parameter at fault: %s", async (query) => {
    const { body } = await app.send("get", `/traverses?sort=taken&${query}`).expect(422);
    expect(body.errors[0].parameter).toBe(query.split("=")[0]);
  });
});

describe("isolation", () => {
  const withId = OPERATIONS.filter(({ scope, path }) => scope !== null && scope !== "calculations" && path.includes("{id}"));
  let owner: Partner;
  let others: Partner[];
  const ids: Record<string, string> = {};

  beforeAll(async () => {
    owner = await partner({ environment: "production" });
    others = [await partner({ environment: "production" }), await partner({ organisationId: owner.organisationId, environment: "sandbox" })];
    ids["traverses"] = await issuedRecord(owner);
    const { body } = await owner.send("get", `/traverses/${ids["traverses"]}`);
    Object.assign(ids, { projects: body.projectId, instruments: body.instrumentId, calibrations: body.instrument.calibration.id });
  });

  it.each(withId.map((definition) => [`${definition.method} ${definition.path}`, definition] as const))("another organisation's key and the other environment's get 404: %s", async (_, { method, path, body }) => {
    const kind = path.split("/")[1]!;
    const address = path.replace("{id}", ids[kind] ?? `${{ "webhook-endpoints": "whe", events: "evt", attachments: "att", imports: "imp" }[kind]}_01kbc000000000000000000000`).replace("{calibrationId}", ids["calibrations"]!).replace(/\{(\w+)Id\}/, (_all, name: string) => `${{ attachment: "att", delivery: "dlv" }[name]}_01kbc000000000000000000000`);
    for (const other of others) {
      const answer = await other.send(method as "get", address, body ? bodyFor(path) : undefined);
      expect(answer.status, `${method} ${address}: ${answer.text}`).toBe(404);
      expect(answer.body.type).toContain("not-found");
    }
  });

  it("lists show nothing of it", async () => {
    for (const other of others) for (const kind of ["projects", "instruments", "traverses"]) expect((await other.send("get", `/${kind}`)).body.items).toEqual([]);
  });
});

/** A body that fits, so that nothing but the id can be at fault. */
function bodyFor(path: string): unknown {
  if (path.endsWith("/void")) return { reason: "x" };
  if (path.endsWith("/calibrations")) return { calibratedOn: "2026-01-01", dueOn: "2027-01-01" };
  return {};
}
