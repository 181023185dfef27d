import { createConfig, lintFromString } from "@redocly/openapi-core";
import { readFileSync } from "node:fs";
import path from "node:path";
import { beforeAll, describe, expect, it } from "vitest";
import { openApiText } from "@/api-spec/document";
import { OPERATIONS } from "@/api-spec/registry";
import { api } from "../support/api";
import { makeKey } from "../support/accounts";

const committed = readFileSync(path.join(import.meta.dirname, "../../api-spec/openapi.json"), "utf8");

describe("the OpenAPI document", () => {
  it("is the one the definitions generate", () => {
    expect(committed, "run: npm run openapi").toBe(openApiText());
  });

  it("is served as committed", async () => {
    const { body } = await api().get("/api/v1/openapi.json").expect(200);
    expect(body).toEqual(JSON.parse(committed));
  });

  it("is clean under the recommended rules of a well-known linter", async () => {
    const config = await createConfig({ extends: ["recommended"] });
    const findings = await lintFromString({ source: committed, config });
    expect(findings.map(({ ruleId, message, location }) => `${ruleId}: ${message} at ${location[0]?.pointer}`)).toEqual([]);
  });
});

describe("every example in the reference", () => {
  let key: string;
  beforeAll(async () => {
    key = (await makeKey({ scopes: ["calculations"] })).text;
  });

  const examples = OPERATIONS.flatMap((definition) => (definition.examples ?? []).map((example) => ({ title: `${definition.id}: ${example.name}`, definition, example })));

  it.each(examples)("$title runs, and its answer fits the documented schema", async ({ definition, example }) => {
    const { body } = await api().post(`/api/v1${definition.path}`).set("Authorization", `Bearer ${key}`).send(example.body as object).expect(definition.status ?? 200);
    const parsed = definition.answer.safeParse(body);
    expect(parsed.error?.issues ?? []).toEqual([]);
  });

  it("exists for every calculation", () => {
    const without = OPERATIONS.filter((definition) => definition.tag === "Calculations" && !definition.examples?.length);
    expect(without.map(({ id }) => id)).toEqual([]);
  });
});
