import { readFileSync } from "node:fs";
import path from "node:path";
import request from "supertest";
import { beforeAll, describe, expect, it } from "vitest";
import { importAnswer } from "@/api-spec/records/imports";
import { testDatabase } from "../support/accounts";
import { arrange, partner, SUPPLY_MAIN, type Partner } from "../support/records";

const template = (name: string): Buffer => readFileSync(path.join(import.meta.dirname, "../../examples/csv", name));

let app: Partner;
let projectId: string;
let instrumentId: string;
beforeAll(async () => {
  app = await partner();
  ({ projectId, instrumentId } = await arrange(app));
});

interface Sent {
  by?: Partner;
  query?: string;
  type?: string;
  headers?: Record<string, string>;
}

function send(file: string | Buffer, { by = app, query = "", type = "text/csv", headers = {} }: Sent = {}): request.Test {
  return request(process.env.AVERDUCT_TEST_URL!).post(`/api/v1/imports?${query}`).set("Authorization", `Bearer ${by.key}`).set({ "Content-Type": type, ...headers }).serialize((body: unknown) => body as string).send(file as never);
}
const check = async (file: string | Buffer, sent: Sent = {}) => importAnswer.parse((await send(file, { ...sent, query: `projectId=${projectId}&${sent.query ?? ""}` }).expect(200)).body);
const commit = (file: string | Buffer, sent: Sent = {}): request.Test => send(file, { ...sent, query: `mode=commit&projectId=${projectId}&${sent.query ?? ""}` });
const draftCount = async (by: Partner): Promise<number> => Number((await testDatabase()("traverses").where({ organisation_id: by.organisationId }).count({ count: "*" }))[0]!["count"]);

describe("the templates", () => {
  it.each(["row-per-traverse", "row-per-reading"] as const)("%s.csv: a dry run finds no fault and makes nothing; the commit makes what the API makes of the same fields", async (name) => {
    const by = await partner();
    const { projectId: project } = await arrange(by);
    const dry = importAnswer.parse((await send(template(`${name}.csv`), { by, query: `projectId=${project}` }).expect(200)).body);
    expect(dry).toMatchObject({ id: null, mode: "dry_run", faults: [], faultCount: 0, delimiter: "comma", form: name.replaceAll("-", "_"), createdAt: null });
    expect(dry.traverses.map(({ reference, id, readings }) => [reference, id, readings])).toEqual([["T1", null, 25], ["T2", null, 12], ["T3", null, 14]]);
    expect(await draftCount(by)).toBe(0);

    const made = importAnswer.parse((await send(template(`${name}.csv`), { by, query: `mode=commit&projectId=${project}` }).expect(200)).body);
    expect(made.traverses.map(({ id: _id, ...rest }) => rest)).toEqual(dry.traverses.map(({ id: _id, ...rest }) => rest));
    const stored = await Promise.all(made.traverses.map(async ({ id }) => (await by.send("get", `/traverses/${id}`).expect(200)).body));
    expect(stored[0]).toMatchObject({
      status: "draft", projectId: project, system: "AHU-1", technician: "R. Okonjo-Lindqvist", takenAt: "2026-11-20T14:05:00.000Z", holes: { count: 5, sealed: true, method: "plugs" },
      duct: { shape: "rectangular", measured: "outside", width: { value: 26, unit: "in" }, height: { value: 18, unit: "in" }, wall: { lining: { value: 1, unit: "in" } } },
      layout: "log_tchebycheff", enterFrom: "top", air: { relativeHumidity: { value: 85, unit: "percent" }, ductStaticPressure: { value: 1.2, unit: "in_wg" } },
      design: { airflow: { value: 3100, unit: "ft3/min" }, basis: "actual", tolerancePercent: 10 }, site: { downstream: { value: 13, unit: "ft" }, upstream: { value: 5, unit: "ft" } },
    });
    expect(stored[0].readings.lines[4]).toEqual([0.06, 0.073, 0.077, 0.074, 0.062]);
    expect(stored[2].readings.lines).toEqual([[840, 905, 918, 896, 832], [868, 941, null, 936, 861], [835, 902, 921, 899, 829]]);
    for (const [index, { airflow, percentOfDesign }] of made.traverses.entries()) {
      const { duct, readings, air, layout, site, design, units } = stored[index];
      const given = Object.fromEntries(Object.entries({ duct, readings, air, layout, site, design, units }).filter(([, value]) => value !== null));
      const { body } = await by.send("post", "/calculations/airflow", given).expect(200);
      expect(airflow).toEqual(body.airflow.actual);
      expect(percentOfDesign).toBe(body.design?.percent ?? null);
      expect(stored[index].result.airflow).toEqual(body.airflow);
    }
  });
});
