import { beforeAll, describe, expect, it } from "vitest";
import { api, calculate, ROUND_TRAVERSE } from "../support/api";
import { makeKey } from "../support/accounts";

const LINED = {
  shape: "rectangular", measured: "outside", width: { value: 26, unit: "in" }, height: { value: 18, unit: "in" },
  wall: { thickness: { value: 0, unit: "in" }, lining: { value: 1, unit: "in" } },
};
const { readings } = ROUND_TRAVERSE;

describe("bad input gets a problem of its own, with a pointer", () => {
  let key: string;
  beforeAll(async () => {
    key = (await makeKey()).text;
  });

  const raw = (body: string | Buffer, type = "application/json") =>
    api().post("/api/v1/calculations/airflow").set("Authorization", `Bearer ${key}`).set("Content-Type", type).send(body);

  it.each([
    ["malformed JSON", '{"duct": ', 400, "malformed_json"],
    ["NaN, which JSON does not have", '{"duct": NaN}', 400, "malformed_json"],
    ["an empty body", "", 400, "malformed_json"],
    ["a body of 2 MiB", JSON.stringify({ pad: "x".repeat(2 * 1024 ** 2) }), 413, "body_too_large"],
  ])("%s", async (_, body, status, code) => {
    const answer = await raw(body).expect(status);
    expect(answer.body.errors[0]).toMatchObject({ pointer: "", code });
    expect(answer.headers["content-type"]).toBe("application/problem+json");
  });

  it("a body of 2 MiB that does not say its length", async () => {
    const stream = new ReadableStream({
      start(controller) {
        for (let part = 0; part < 32; part += 1) controller.enqueue(new TextEncoder().encode(" ".repeat(64 * 1024)));
        controller.close();
      },
    });
    const answer = await fetch(`${process.env.AVERDUCT_TEST_URL}/api/v1/calculations/airflow`, {
      method: "POST", body: stream, duplex: "half", headers: { Authorization: `Bearer ${key}`, "Content-Type": "application/json" },
    } as RequestInit);
    expect(answer.status).toBe(413);
  });

  it("another content type", async () => {
    const answer = await raw("duct=1", "application/x-www-form-urlencoded").expect(415);
    expect(answer.body.errors[0]).toMatchObject({ header: "Content-Type", code: "unsupported_media_type" });
  });

  it.each<[string, unknown, string, string]>([
    ["a missing duct", { readings }, "", "missing_field"],
    ["a misspelt field", { ...ROUND_TRAVERSE, desing: {} }, "/desing", "unrecognized_field"],
    ["a wrong unit", { readings, duct: { ...ROUND_TRAVERSE.duct, diameter: { value: 14, unit: "inch" } } }, "/duct/diameter/unit", "invalid_value"],
    ["a unit of another quantity", { readings, duct: { ...ROUND_TRAVERSE.duct, diameter: { value: 14, unit: "Pa" } } }, "/duct/diameter/unit", "invalid_value"],
    ["an unknown shape", { readings, duct: { ...ROUND_TRAVERSE.duct, shape: "square" } }, "/duct/shape", "invalid_value"],
    ["a string for a number", { readings, duct: { ...ROUND_TRAVERSE.duct, diameter: { value: "14", unit: "in" } } }, "/duct/diameter/value", "invalid_type"],
    ["a string among the readings", { ...ROUND_TRAVERSE, readings: { ...readings, lines: [[900, "1O10"]] } }, "/readings/lines/0/1", "invalid_type"],
    ["an empty list of lines", { ...ROUND_TRAVERSE, readings: { ...readings, lines: [] } }, "/readings/lines", "too_small"],
    ["a list", [], "", "invalid_type"],
  ])("%s", async (_, body, pointer, code) => {
    const answer = await calculate("airflow", key, body).expect(422);
    expect(answer.body.type).toMatch(/invalid-request$/);
    expect(answer.body.errors).toContainEqual(expect.objectContaining({ pointer, code }));
  });

  it.each<[string, unknown, string]>([
    ["a negative dimension", { readings, duct: { ...ROUND_TRAVERSE.duct, diameter: { value: -14, unit: "in" } } }, "/duct/diameter"],
    ["lining thicker than the duct", { readings, duct: { ...LINED, wall: { lining: { value: 9, unit: "in" } } } }, "/duct/height"],
    ["readings of which none could be taken", { ...ROUND_TRAVERSE, readings: { ...readings, lines: [[null, null]] } }, "/readings/lines"],
    ["humidity over 100 %", { ...ROUND_TRAVERSE, air: { dryBulb: { value: 58, unit: "degF" }, relativeHumidity: { value: 101, unit: "percent" } } }, "/air/relativeHumidity"],
    ["two humidities", { ...ROUND_TRAVERSE, air: { dryBulb: { value: 58, unit: "degF" }, relativeHumidity: { value: 50, unit: "percent" }, humidityRatio: 0.01 } }, "/air/humidityRatio"],
    ["a pressure no site has", { ...ROUND_TRAVERSE, air: { dryBulb: { value: 58, unit: "degF" }, barometricPressure: { value: 3, unit: "psi" } } }, "/air/barometricPressure"],
    ["a dimension of 1e308", { readings, duct: { ...ROUND_TRAVERSE.duct, diameter: { value: 1e308, unit: "in" } } }, "/duct/diameter"],
    ["a reading of 1e308", { ...ROUND_TRAVERSE, readings: { ...readings, lines: [[900, 1e308]] } }, "/readings/lines/0/1"],
  ])("%s", async (_, body, pointer) => {
    const answer = await calculate("airflow", key, body).expect(422);
    expect(answer.body.errors.some((error: { pointer: string }) => error.pointer.startsWith(pointer))).toBe(true);
  });

  it("a number too large for any machine", async () => {
    const answer = await raw(JSON.stringify(ROUND_TRAVERSE).replace("812", "1e999")).expect(422);
    expect(answer.body.errors[0].pointer).toBe("/readings/lines/0/0");
  });

  it("a reading that could not be taken is skipped, not refused", async () => {
    const answer = await calculate("airflow", key, { ...ROUND_TRAVERSE, readings: { ...readings, lines: [[900, null, 1000]] } }).expect(200);
    expect(answer.body.statistics.count).toBe(2);
    expect(answer.body.averageVelocity.value).toBeCloseTo(950, 9);
  });

  it("lists every fault at once", async () => {
    const answer = await calculate("airflow", key, { duct: { shape: "round", measured: "sideways", diameter: { value: "14", unit: "inch" } }, readings }).expect(422);
    expect(answer.body.errors.length).toBeGreaterThanOrEqual(3);
  });

  it("answers unknown paths and wrong methods with a problem", async () => {
    expect((await api().get("/api/v1/nowhere").expect(404)).headers["content-type"]).toBe("application/problem+json");
    const wrong = await api().get("/api/v1/calculations/airflow").expect(405);
    expect(wrong.headers.allow).toBe("POST");
    expect(wrong.headers["content-type"]).toBe("application/problem+json");
  });

  it("keeps a prototype out of the objects it makes", async () => {
    await raw('{"__proto__":{"admin":true},"constructor":{"prototype":{"x":1}}}').expect(422);
    expect(({} as Record<string, unknown>).admin).toBeUndefined();
  });
});
