import { beforeAll, describe, expect, it } from "vitest";
import { api, ROUND_TRAVERSE } from "../support/api";
import { makeKey, makeOrganisation, testDatabase } from "../support/accounts";

const good = { operation: "airflow", input: ROUND_TRAVERSE };
const bad = { operation: "airflow", input: { ...ROUND_TRAVERSE, duct: { ...ROUND_TRAVERSE.duct, diameter: { value: -1, unit: "in" } } } };

describe("a batch", () => {
  let key: string;
  let organisationId: string;
  beforeAll(async () => {
    ({ text: key, organisationId } = await makeKey());
  });
  const post = (body: unknown) => api().post("/api/v1/calculations/batch").set("Authorization", `Bearer ${key}`).send(body as object);
  const stream = async (lines: string): Promise<{ index: number; status: number; result?: unknown; problem?: { errors: { pointer: string; code: string }[] } }[]> => {
    const answer = await fetch(`${process.env.AVERDUCT_TEST_URL}/api/v1/calculations/batch`, { method: "POST", body: lines, headers: { Authorization: `Bearer ${key}`, "Content-Type": "application/x-ndjson" } });
    expect(answer.status).toBe(200);
    expect(answer.headers.get("content-type")).toBe("application/x-ndjson");
    return (await answer.text()).trim().split("\n").map((line) => JSON.parse(line));
  };

  it("answers every item in order; a bad one has its problem and does not fail the rest", async () => {
    const { body } = await post({ items: [good, bad, { operation: "nothing", input: {} }, good] }).expect(200);
    expect(body.items.map(({ index, status }: { index: number; status: number }) => [index, status])).toEqual([[0, 200], [1, 422], [2, 422], [3, 200]]);
    expect(body.items[0].result.airflow.actual.value).toBe(body.items[3].result.airflow.actual.value);
    expect(body.items[1].problem.errors[0].pointer).toBe("/items/1/input/duct/diameter");
    expect(body.items[2].problem.errors[0].pointer).toBe("/items/2/operation");
  });

  it("answers lines as they come, and a fault of one line never ends the stream", async () => {
    const results = await stream([JSON.stringify(good), "{nonsense", "", JSON.stringify(bad), "x".repeat(1024 ** 2 + 10), JSON.stringify(good)].join("\n"));
    expect(results.map(({ status }) => status)).toEqual([200, 400, 422, 413, 200]);
    expect(results[2]!.problem!.errors[0]!.pointer).toBe("/input/duct/diameter");
  });

  it("streams tens of thousands of lines and counts each", async () => {
    const count = 20_000;
    const results = await stream(`${JSON.stringify(good)}\n`.repeat(count));
    expect(results).toHaveLength(count);
    expect(results.every(({ status }, index) => status === 200 && results[index]!.index === index)).toBe(true);
    await new Promise((resolve) => setTimeout(resolve, 1_000));
    const { sum } = (await testDatabase()("usage_minutes").where({ organisation_id: organisationId, operation: "batch", status: 200 }).sum({ sum: "items" }).first())!;
    expect(Number(sum)).toBe(4 + 5 + count);
  });

  it("takes a thousand items and no more", async () => {
    await post({ items: Array.from({ length: 1000 }, () => ({ operation: "duct-area", input: { duct: ROUND_TRAVERSE.duct } })) }).expect(200);
    const { body } = await post({ items: Array.from({ length: 1001 }, () => good) }).expect(422);
    expect(body.errors[0]).toMatchObject({ pointer: "/items", code: "too_large" });
  });

  it("spends the quota for each item", async () => {
    const { text } = await makeKey({ organisationId: await makeOrganisation({ monthlyRequests: 5 }) });
    const send = (count: number) => api().post("/api/v1/calculations/batch").set("Authorization", `Bearer ${text}`).send({ items: Array.from({ length: count }, () => good) });
    await send(4).expect(200);
    await send(3).expect(429);
    await send(1).expect(429);
  });
});
