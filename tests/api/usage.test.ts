import { describe, expect, it } from "vitest";
import { api, calculate, ROUND_TRAVERSE } from "../support/api";
import { makeKey, testDatabase } from "../support/accounts";

const flushed = (): Promise<void> => new Promise((resolve) => setTimeout(resolve, 1_000));

describe("usage", () => {
  it("counts every request by operation and status, the refused ones included", async () => {
    const { id, text, organisationId } = await makeKey();
    for (let call = 0; call < 3; call += 1) await calculate("airflow", text, ROUND_TRAVERSE).expect(200);
    await calculate("airflow", text, {}).expect(422);
    await flushed();
    const rows = await testDatabase()("usage_minutes").where({ organisation_id: organisationId }).orderBy("status");
    const totals = new Map<string, number>();
    for (const { operation, status, requests } of rows) totals.set(`${operation} ${status}`, (totals.get(`${operation} ${status}`) ?? 0) + requests);
    expect([...totals]).toEqual([["airflow 200", 3], ["airflow 422", 1]]);
    const key = await testDatabase()("api_keys").where({ id }).first();
    expect(key.last_used_at).toBeInstanceOf(Date);
    expect(["127.0.0.1", "::1"]).toContain(key.last_used_from);
  });

  it("counts a request of nobody", async () => {
    const count = async (): Promise<number> => Number((await testDatabase()("usage_minutes").where({ organisation_id: "", operation: "airDensity", status: 401 }).sum({ sum: "requests" }).first())?.sum ?? 0);
    const before = await count();
    await api().post("/api/v1/calculations/air-density").send({}).expect(401);
    await flushed();
    expect(await count()).toBe(before + 1);
  });

  it("keeps recent requests with the problem they were answered with", async () => {
    const { text, organisationId } = await makeKey();
    const { headers } = await calculate("airflow", text, { duct: 1 }).expect(422);
    await flushed();
    const row = await testDatabase()("requests").where({ organisation_id: organisationId }).first();
    expect(row).toMatchObject({ id: headers["request-id"], problem: "invalid-request", status: 422 });
  });
});

describe("usage through the API", () => {
  it("gives the organisation's own, by day, key and operation", async () => {
    const { text, organisationId, id } = await makeKey({ scopes: ["calculations", "usage:read"] });
    for (let call = 0; call < 3; call += 1) await calculate("airflow", text, ROUND_TRAVERSE).expect(200);
    await calculate("airflow", text, {}).expect(422);
    await new Promise((resolve) => setTimeout(resolve, 800));
    const today = new Date().toISOString().slice(0, 10);
    const { body } = await api().get(`/api/v1/usage?from=${today}&to=${today}`).set("Authorization", `Bearer ${text}`).expect(200);
    expect(body.items.find(({ operation }: { operation: string }) => operation === "airflow")).toMatchObject({ day: today, keyId: id, environment: "sandbox", requests: 4, refused: 1, items: 4 });
    const other = await makeKey({ organisationId: (await makeKey()).organisationId, scopes: ["usage:read"] });
    const theirs = await api().get(`/api/v1/usage?from=${today}&to=${today}`).set("Authorization", `Bearer ${other.text}`).expect(200);
    expect(JSON.stringify(theirs.body)).not.toContain(id);
    expect(organisationId).not.toBe(other.organisationId);
    const { body: refused } = await api().get(`/api/v1/usage?from=${today}&to=2020-01-01`).set("Authorization", `Bearer ${text}`).expect(422);
    expect(refused.errors[0]).toMatchObject({ parameter: "to", code: "days_reversed" });
  });
});
