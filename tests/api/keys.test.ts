import { beforeAll, describe, expect, it } from "vitest";
import { api, calculate, ROUND_TRAVERSE } from "../support/api";
import { makeKey, makeOrganisation, testDatabase } from "../support/accounts";

const HOUR = 3_600_000;

describe("API keys", () => {
  let key: Awaited<ReturnType<typeof makeKey>>;
  beforeAll(async () => {
    key = await makeKey();
  });

  it("lets a valid key calculate, and says what is left of the limits", async () => {
    const answer = await calculate("airflow", key.text, ROUND_TRAVERSE).expect(200);
    expect(answer.body.airflow.actual.unit).toBe("ft3/min");
    expect(answer.headers["request-id"]).toMatch(/^req_[0-9a-z]{26}$/);
    expect(answer.headers["ratelimit-policy"]).toMatch(/^"burst";q=10000;w=1, "month";q=10000000;w=\d+$/);
    expect(answer.headers.ratelimit).toMatch(/^"burst";r=\d+;t=1, "month";r=\d+;t=\d+$/);
  });

  const refused = async (slug: string, status: number, authorization: string | null): Promise<void> => {
    const call = api().post("/api/v1/calculations/airflow");
    if (authorization !== null) call.set("Authorization", authorization);
    const { body, headers } = await call.send(ROUND_TRAVERSE).expect(status);
    expect(headers["content-type"]).toBe("application/problem+json");
    expect(body.type).toMatch(new RegExp(`/docs/problems/${slug}$`));
    expect(body.errors[0]).toMatchObject({ pointer: "", header: "Authorization", code: slug.replaceAll("-", "_") });
    expect(headers["www-authenticate"]).toMatch(/^Bearer realm="averduct"/);
    expect(body.requestId).toBe(headers["request-id"]);
  };

  it("refuses a request without a key", () => refused("missing-key", 401, null));
  it("refuses another scheme", () => refused("missing-key", 401, "Basic YTpi"));
  it("refuses a mistyped key by its checksum", () => {
    const wrong = key.text.at(-10) === "x" ? "y" : "x";
    return refused("malformed-key", 401, `Bearer ${key.text.slice(0, -10)}${wrong}${key.text.slice(-9)}`);
  });
  it("refuses a well-formed key that is on no record", async () => {
    const { makeKeyText } = await import("@/lib/keys/keyText");
    await refused("unknown-key", 401, `Bearer ${makeKeyText("sandbox").text}`);
  });
  it("refuses a revoked key", async () => refused("revoked-key", 401, `Bearer ${(await makeKey({ revokedAt: new Date(Date.now() - HOUR) })).text}`));
  it("refuses an expired key", async () => refused("expired-key", 401, `Bearer ${(await makeKey({ expiresAt: new Date(Date.now() - HOUR) })).text}`));
  it("refuses a key without the scope", async () => refused("insufficient-scope", 403, `Bearer ${(await makeKey({ scopes: ["usage:read"] })).text}`));
  it("refuses a key outside its networks", async () => refused("network-not-allowed", 403, `Bearer ${(await makeKey({ allowedNetworks: ["192.0.2.0/24"] })).text}`));
  it("lets a key in from an allowed network", async () => {
    const { text } = await makeKey({ allowedNetworks: ["192.0.2.0/24", "127.0.0.0/8", "::1/128"] });
    await calculate("airflow", text, ROUND_TRAVERSE).expect(200);
  });
  it("does not believe a forwarded address when no proxy is trusted", async () => {
    const { text } = await makeKey({ allowedNetworks: ["192.0.2.0/24"] });
    await calculate("airflow", text, ROUND_TRAVERSE).set("X-Forwarded-For", "192.0.2.7").expect(403);
  });
  it("refuses every key of a suspended organisation", async () => {
    const organisationId = await makeOrganisation();
    await testDatabase()("organisations").where({ id: organisationId }).update({ suspended_at: new Date(), suspended_reason: "unpaid" });
    await refused("account-suspended", 403, `Bearer ${(await makeKey({ organisationId })).text}`);
  });

  it("refuses a key within 5 s of its revocation, though it was in use", async () => {
    const { id, text } = await makeKey();
    await calculate("airflow", text, ROUND_TRAVERSE).expect(200);
    await testDatabase()("api_keys").where({ id }).update({ revoked_at: new Date() });
    const revokedAt = Date.now();
    let status = 200;
    while (status === 200 && Date.now() - revokedAt < 5_000) {
      status = (await calculate("airflow", text, ROUND_TRAVERSE)).status;
      await new Promise((resolve) => setTimeout(resolve, 100));
    }
    expect(status).toBe(401);
  });
});
