import { beforeAll, describe, expect, it } from "vitest";
import { OPERATIONS } from "@/api-spec/registry";
import { documentedOperations, draws, fitting, spoiled, type Draws, type Operation, type Schema } from "../support/generate";
import { arrange, issuedRecord, partner, SUPPLY_MAIN, type Partner } from "../support/records";

/** In `npm test` a few of each; `CONTRACT_REQUESTS=50000 npm test -- tests/api/contract.test.ts` looks further, from another seed. */
const REQUESTS = Number(process.env["CONTRACT_REQUESTS"] ?? 2_500);
const SEED = process.env["CONTRACT_REQUESTS"] ? Date.now() % 2 ** 31 : 20_261_201;
const GARBAGE = ["", "null", "[]", "{", '"text"', "{\"a\":1e999}", "\u0000", "[".repeat(2_000), '{"__proto__":{"x":1}}', "-", "{}", "{\"duct\":".repeat(50)];

interface Sent {
  method: string;
  address: string;
  body: string | undefined;
}

describe("requests made from the contract", () => {
  let app: Partner;
  const known: Record<string, string[]> = {};
  beforeAll(async () => {
    app = await partner();
    const { projectId, instrumentId } = await arrange(app);
    const drafts = [];
    for (let number = 0; number < 3; number += 1) drafts.push((await app.send("post", "/traverses", { ...SUPPLY_MAIN, projectId, instrumentId }).expect(201)).body.id as string);
    const issued = await issuedRecord(app);
    const calibration = (await app.send("get", `/instruments/${instrumentId}/calibrations`)).body.items[0].id as string;
    Object.assign(known, { prj: [projectId], ins: [instrumentId], trv: [...drafts, issued], cal: [calibration] });
  });

  // Multipart and plain text have tests of their own; here is what goes as JSON.
  const operations = documentedOperations().filter(({ operation }) => !operation.requestBody || operation.requestBody.content["application/json"]);

  it.each(operations.map((one) => [one.operation.operationId, one] as const))("%s: no 500, documented answers, problems with pointers that exist", async (id, { method, path, operation }) => {
    const each = Math.ceil(REQUESTS / operations.length);
    const by = draws(SEED + operations.findIndex(({ operation: { operationId } }) => operationId === id));
    for (let number = 0; number < each; number += 1) {
      const sent = request(method, path, operation, by, known);
      const answer = await fetch(`${process.env.AVERDUCT_TEST_URL}/api/v1${sent.address}`, {
        method: method.toUpperCase(), body: sent.body, headers: { Authorization: `Bearer ${app.key}`, "Content-Type": "application/json" },
      });
      check(id, operation, sent, answer.status, answer.headers.get("content-type") ?? "", await answer.text());
    }
  });
});

function request(method: string, path: string, { parameters = [], requestBody }: Operation, by: Draws, known: Record<string, string[]>): Sent {
  const value = (schema: Schema): string => String(by.chance(0.9) ? fitting(schema, by, known) : by.pick(["", "x", "-1", "1e9", "%00", "trv_", "../..", "null"]));
  const inPath = path.replace(/\{(\w+)\}/g, (_, name: string) => encodeURIComponent(value(parameters.find((one) => one.name === name)!.schema)) || "x");
  const query = parameters.filter((one) => one.in === "query" && (one.required || by.chance(0.3))).map(({ name, schema }) => `${name}=${encodeURIComponent(value(schema))}`);
  if (by.chance(0.05)) query.push("colour=red");
  const schema = requestBody?.content["application/json"]?.schema;
  return { method, address: `${inPath}${query.length > 0 ? `?${query.join("&")}` : ""}`, body: schema && bodyOf(schema, by, known) };
}

function bodyOf(schema: Schema, by: Draws, known: Record<string, string[]>): string {
  const kind = by.next();
  if (kind < 0.1) return by.pick(GARBAGE);
  const whole = fitting(schema, by, known);
  return JSON.stringify(kind < 0.55 ? whole : spoiled(whole, by)) ?? "null";
}

function check(id: string, operation: Operation, sent: Sent, status: number, type: string, text: string): void {
  const told = `${sent.method} ${sent.address}\n${sent.body?.slice(0, 2_000)}\n→ ${status} ${text.slice(0, 1_000)}`;
  expect(status, told).toBeLessThan(500);
  // A path or query that is no path or query of the operation leads elsewhere.
  if (status === 404 || status === 405) return;
  expect(Object.keys(operation.responses), told).toContain(String(status));
  if (status >= 400) {
    expect(type, told).toBe("application/problem+json");
    const problem = JSON.parse(text) as { errors?: { pointer: string }[] };
    // What is missing for issue is told by its place in the stored traverse; nothing was sent.
    const stored = text.includes("/problems/not-ready-to-issue");
    for (const { pointer } of stored ? [] : (problem.errors ?? [])) expect(exists(sent.body, pointer), `${pointer} in ${told}`).toBe(true);
    return;
  }
  if (!type.startsWith("application/json")) return;
  const definition = OPERATIONS.find((one) => one.id === id)!;
  expect(definition.answer.safeParse(JSON.parse(text)).error?.issues ?? [], told).toEqual([]);
}

/** Whether a JSON Pointer leads to something in what was sent; the empty one is the whole. */
function exists(body: string | undefined, pointer: string): boolean {
  if (pointer === "") return true;
  let value: unknown = JSON.parse(body!);
  for (const part of pointer.slice(1).split("/").map((one) => one.replaceAll("~1", "/").replaceAll("~0", "~"))) {
    if (typeof value !== "object" || value === null || !Object.hasOwn(value, part)) return false;
    value = (value as Record<string, unknown>)[part];
  }
  return true;
}
