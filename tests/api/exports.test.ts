import type { ReadableStream as NodeReadableStream } from "node:stream/web";
import { setTimeout } from "node:timers/promises";
import { parse } from "csv-parse/sync";
import { beforeAll, describe, expect, it } from "vitest";
import { EXPORT_COLUMNS } from "@/api-spec/records/exports";
import { newId } from "@/lib/ids/newId";
import { testDatabase } from "../support/accounts";
import { appMemory } from "../support/appMemory";
import { arrange, issuedRecord, partner, SUPPLY_MAIN, type Partner } from "../support/records";

const open = (by: Partner, query: string, signal?: AbortSignal): Promise<Response> =>
  fetch(`${process.env.AVERDUCT_TEST_URL}/api/v1/exports/traverses?${query}`, { headers: { Authorization: `Bearer ${by.key}` }, signal });
const csvOf = async (by: Partner, query = ""): Promise<Record<string, string>[]> => parse(await (await open(by, query)).text(), { columns: true });
const ndjsonOf = async (by: Partner, query = ""): Promise<Record<string, unknown>[]> =>
  (await (await open(by, `format=ndjson&${query}`)).text()).split("\n").filter(Boolean).map((line) => JSON.parse(line) as Record<string, unknown>);

/** Copies a traverse in the database, so that there are many. The ids sort in the order given. */
async function copies(traverse: string, count: number): Promise<void> {
  const columns = Object.keys((await testDatabase()("traverses").where({ id: traverse }).first())!).filter((name) => name !== "id").join(", ");
  await testDatabase().raw(`INSERT INTO traverses (id, ${columns}) SELECT CONCAT(LEFT(?, 17), LPAD(seq, 13, '0')), ${columns} FROM seq_1_to_${count} JOIN traverses ON id = ?`, [newId("trv"), traverse]);
}

describe("an export", () => {
  let app: Partner;
  let references: { projectId: string; instrumentId: string };
  let ids: string[];
  beforeAll(async () => {
    app = await partner();
    references = await arrange(app);
    const draft = async (fields: object): Promise<string> => (await app.send("post", "/traverses", { projectId: references.projectId, ...fields }).expect(201)).body.id as string;
    ids = [
      await issuedRecord(app),
      await draft({ ...SUPPLY_MAIN, ...references, notes: 'Said "windy", twice;\r\nthen stopped', air: undefined, units: "si" }),
      await draft({ system: "=1+1", location: "+HYPERLINK(\"http://x.example\")", technician: "@SUM(A1)", notes: "-2+3" }),
      await draft({ system: "-5", location: "＝1+1", technician: "'=quoted", duct: { shape: "flat_oval", measured: "inside", major: { value: 36, unit: "in" }, minor: { value: 355.6, unit: "mm" } } }),
    ];
    await app.send("post", `/traverses/${ids[0]}/void`, { reason: "Wrong plane" }).expect(200);
  });

  it("as NDJSON gives each traverse as the API does, the first made first", async () => {
    const lines = await ndjsonOf(app);
    expect(lines.map(({ id }) => id)).toEqual(ids);
    for (const line of lines) expect(line).toEqual((await app.send("get", `/traverses/${String(line["id"])}`).expect(200)).body);
  });

  it("as CSV gives the same figures to the last digit, with their units", async () => {
    const answer = await open(app, "");
    expect(answer.headers.get("content-type")).toBe("text/csv; charset=utf-8; header=present");
    expect(answer.headers.get("content-disposition")).toMatch(/^attachment; filename="traverses-\d{4}-\d\d-\d\d\.csv"$/);
    const text = await answer.text();
    expect(text.split("\r\n")[0]).toBe(Object.keys(EXPORT_COLUMNS).join(","));
    const rows: Record<string, string>[] = parse(text, { columns: true });
    expect(rows.map(({ id }) => id)).toEqual(ids);
    for (const row of rows.slice(0, 2)) {
      const { body } = await app.send("get", `/traverses/${row["id"]}`).expect(200);
      const { result, duct } = body;
      const quantity = (name: string): object => ({ value: Number(row[name]), unit: row[`${name}_unit`] });
      expect([quantity("airflow"), quantity("standard_airflow"), quantity("mass_flow")]).toEqual([result.airflow.actual, result.airflow.standard, result.airflow.mass]);
      expect([quantity("area"), quantity("average_velocity"), quantity("air_density")]).toEqual([result.area, result.averageVelocity, result.air.density]);
      expect([quantity("width"), quantity("height"), quantity("lining"), quantity("design_airflow")]).toEqual([duct.width, duct.height, duct.wall.lining, body.design.airflow]);
      expect([row["percent_of_design"], row["uncertainty_percent"], row["points"]].map(Number)).toEqual([result.design.percent, result.uncertainty.expandedPercent, 25]);
      expect(row).toMatchObject({ status: body.status, system: "AHU-1", notes: body.notes ?? "", taken_at: body.takenAt, verdict: result.design.verdict, instrument_serial_number: "TA-0412", holes: "5", holes_sealed: "true", diameter: "", diameter_unit: "" });
      expect(row["failed_checks"]).toBe(result.checks.filter(({ passed }: { passed: boolean }) => !passed).map(({ code }: { code: string }) => code).join(" "));
    }
    expect(rows[0]).toMatchObject({ status: "void", void_reason: "Wrong plane", airflow_unit: "ft3/min" });
    expect(rows[1]).toMatchObject({ airflow_unit: "L/s", average_velocity_unit: "m/s" });
    expect(rows[3]).toMatchObject({ major: "36", major_unit: "in", minor: "355.6", minor_unit: "mm", airflow: "" });
  });

  it("has no cell that a spreadsheet takes for a formula, and leaves plain numbers alone", async () => {
    const rows = await csvOf(app);
    expect(rows[2]).toMatchObject({ system: "'=1+1", location: "'+HYPERLINK(\"http://x.example\")", technician: "'@SUM(A1)", notes: "'-2+3" });
    expect(rows[3]).toMatchObject({ system: "-5", location: "'＝1+1", technician: "'=quoted" });
    for (const row of rows) for (const cell of Object.values(row)) expect(cell).not.toMatch(/^(?![+-]?\d+(\.\d+)?$)[=+\-@\t\r]/);
  });

  it("takes the filters of the list, and refuses what it does not know", async () => {
    expect((await csvOf(app, "status=void")).map(({ id }) => id)).toEqual([ids[0]]);
    expect((await ndjsonOf(app, "system=AHU-1&status=draft")).map(({ id }) => id)).toEqual([ids[1]]);
    expect(await csvOf(app, "projectId=prj_01kbc000000000000000000000")).toEqual([]);
    for (const query of ["format=xlsx", "colour=red", "status=open"]) {
      const refused = await open(app, query);
      expect([refused.status, refused.headers.get("content-type")]).toEqual([422, "application/problem+json"]);
    }
  });

  it("shows nothing of another organisation or environment, and needs the scope to read", async () => {
    for (const other of [await partner(), await partner({ organisationId: app.organisationId, environment: "production" })]) {
      expect(await csvOf(other)).toEqual([]);
      expect(await ndjsonOf(other)).toEqual([]);
    }
    expect((await open(await partner({ organisationId: app.organisationId, scopes: ["records:write"] }), "")).status).toBe(403);
  });

  it("breaks off where a row cannot be given, so that nobody takes a part for the whole", async () => {
    const by = await partner();
    const { projectId } = await arrange(by);
    const { body } = await by.send("post", "/traverses", { ...SUPPLY_MAIN, projectId }).expect(201);
    await copies(body.id, 120);
    const [last] = await testDatabase()("traverses").where({ organisation_id: by.organisationId }).orderBy("id", "desc").limit(1).select("id");
    expect(await csvOf(by)).toHaveLength(121);
    await testDatabase()("traverses").where({ id: last.id }).update({ input: "null" });
    for (const format of ["csv", "ndjson"]) {
      const answer = await open(by, `format=${format}`);
      expect(answer.status).toBe(200);
      await expect(answer.text()).rejects.toThrow();
    }
  });
});

describe("an export of 20,000 traverses", () => {
  const COUNT = 20_000;
  let by: Partner;
  beforeAll(async () => {
    by = await partner();
    const { projectId } = await arrange(by);
    const { body } = await by.send("post", "/traverses", { ...SUPPLY_MAIN, projectId }).expect(201);
    await testDatabase()("traverses").where({ id: body.id }).update({ result: testDatabase().raw("JSON_REMOVE(result, '$.working')") });
    await copies(body.id, COUNT - 1);
  });

  it.each(["csv", "ndjson"])("as %s is whole, and takes no more memory than a small one", async (format) => {
    const begin = performance.now();
    const before = appMemory();
    let [most, bytes, lines] = [0, 0, 0];
    for await (const chunk of (await open(by, `format=${format}`)).body as NodeReadableStream<Uint8Array>) {
      bytes += chunk.length;
      lines += Buffer.from(chunk).filter((byte) => byte === 10).length;
      most = Math.max(most, appMemory());
    }
    console.log(`${format}: ${(bytes / 1024 ** 2).toFixed(0)} MiB in ${((performance.now() - begin) / 1000).toFixed(1)} s; memory ${before.toFixed(0)} MiB before, ${most.toFixed(0)} at most`);
    expect(lines).toBe(COUNT + (format === "csv" ? 1 : 0));
    expect(most - before).toBeLessThan(100);
  }, 180_000);

  it("waits for a reader who does not read", async () => {
    const abort = new AbortController();
    const before = appMemory();
    const reader = (await open(by, "format=ndjson", abort.signal)).body!.getReader();
    await reader.read();
    await setTimeout(3_000);
    expect(appMemory() - before).toBeLessThan(60);
    abort.abort();
  });
});
