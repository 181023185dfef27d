import { createHash } from "node:crypto";
import request from "supertest";
import { describe, expect, it, vi } from "vitest";
import { testDatabase } from "../support/accounts";
import { freshAddress, freshEmail, mailTo, openAccount, PASSWORD, portal, sessionOf, tokenSentTo } from "../support/portal";

const signUp = { name: "Bram Achterlund", organisation: "Slateboard Software", password: PASSWORD };
const keyRequest = { name: "Field app", environment: "sandbox", scopes: ["calculations"] };

/** The middle of how many milliseconds several runs take. */
async function medianOf(runs: number, run: () => PromiseLike<unknown>): Promise<number> {
  const durations: number[] = [];
  for (let index = 0; index < runs; index += 1) {
    const start = performance.now();
    await run();
    durations.push(performance.now() - start);
  }
  return durations.sort((one, other) => one - other)[Math.floor(runs / 2)]!;
}

describe("opening an account", () => {
  it("goes from sign-up through the e-mail to a session", async () => {
    const { cookie } = await openAccount();
    await request(process.env.AVERDUCT_TEST_URL!).get("/api/portal/keys").set("Cookie", cookie).expect(200, { items: [] });
  });

  it("answers the same for an address that has an account already", async () => {
    const { email } = await openAccount();
    const answer = await portal("auth/sign-up", { ...signUp, email }).expect(201);
    expect(answer.body).toEqual({});
    expect(sessionOf(answer)).toBeUndefined();
    expect(await testDatabase()("users").where({ email })).toHaveLength(1);
    expect((await mailTo(email, "It has one already")).subject).toBe("You have an account already");
  });

  it.each([
    ["a short password", { password: "short" }, "/password"],
    ["a common password", { password: "password123" }, "/password"],
    ["no e-mail address", { email: "somebody" }, "/email"],
    ["an empty name", { name: "  " }, "/name"],
    ["a line break in a name", { name: "A\r\nBcc: b@example.org" }, "/name"],
  ])("refuses %s, with its field", async (_, change, pointer) => {
    const { body } = await portal("auth/sign-up", { ...signUp, email: freshEmail(), ...change }).expect(422);
    expect(body.errors[0].pointer).toBe(pointer);
  });

  it("names every field at fault at once", async () => {
    const { body } = await portal("auth/sign-up", { email: "somebody", name: "", organisation: "", password: "short" }).expect(422);
    expect(body.errors.map(({ pointer }: { pointer: string }) => pointer).sort()).toEqual(["/email", "/name", "/organisation", "/password"]);
  });

  it("takes a link once", async () => {
    const email = freshEmail();
    await portal("auth/sign-up", { ...signUp, email }).expect(201);
    const token = await tokenSentTo(email);
    await portal("auth/verify-email", { token }).expect(200);
    expect((await portal("auth/verify-email", { token }).expect(410)).body.errors[0].code).toBe("link_not_valid");
  });

  it("refuses an expired link", async () => {
    const email = freshEmail();
    await portal("auth/sign-up", { ...signUp, email }).expect(201);
    const token = await tokenSentTo(email);
    const user = await testDatabase()("users").where({ email }).first();
    await testDatabase()("email_tokens").where({ user_id: user.id }).update({ expires_at: new Date(Date.now() - 1_000) });
    await portal("auth/verify-email", { token }).expect(410);
  });

  it("keeps the password as an argon2id hash with the parameters of OWASP's Password Storage Cheat Sheet", async () => {
    const { email } = await openAccount();
    const { password_hash: stored } = await testDatabase()("users").where({ email }).first();
    expect(stored).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  });

  it("takes as long for an address that has an account already", async () => {
    const { email } = await openAccount();
    const median = async (addressOf: () => string): Promise<number> => medianOf(7, () => portal("auth/sign-up", { ...signUp, email: addressOf() }).expect(201));
    const [known, unknown] = [await median(() => email), await median(freshEmail)];
    expect(Math.min(known, unknown)).toBeGreaterThan(140);
    expect(Math.abs(known - unknown)).toBeLessThan(0.3 * Math.min(known, unknown));
  });

  it("keeps a link's token as a hash, good for its own purpose only", async () => {
    const { email } = await openAccount();
    await portal("auth/forgot-password", { email }).expect(202);
    const token = await tokenSentTo(email, "reset-password");
    const row = await testDatabase()("email_tokens").where({ token_hash: createHash("sha256").update(token).digest() }).first();
    expect(row.purpose).toBe("reset_password");
    expect(JSON.stringify(row)).not.toContain(token);
    await portal("auth/verify-email", { token }).expect(410);
  });

  it("makes no key before the e-mail is confirmed", async () => {
    const email = freshEmail();
    await portal("auth/sign-up", { ...signUp, email }).expect(201);
    const cookie = sessionOf(await portal("auth/sign-in", { email, password: PASSWORD }).expect(200));
    expect((await portal("keys", keyRequest, cookie).expect(403)).body.type).toMatch(/email-not-verified$/);
  });
});

describe("signing in", () => {
  it("answers alike for a wrong password and an unknown address", async () => {
    const { email } = await openAccount();
    const wrong = await portal("auth/sign-in", { email, password: "not the password" }).expect(401);
    const unknown = await portal("auth/sign-in", { email: freshEmail(), password: "not the password" }).expect(401);
    expect({ ...wrong.body, requestId: "" }).toEqual({ ...unknown.body, requestId: "" });
  });

  it("takes as long for an unknown address as for a wrong password", async () => {
    const { email } = await openAccount();
    const median = async (addressOf: () => string): Promise<number> => medianOf(15, () => portal("auth/sign-in", { email: addressOf(), password: "not the password" }).expect(401));
    const [known, unknown] = [await median(() => email), await median(freshEmail)];
    // Without a hash to compare with, an unknown address would be answered in a fraction of the time.
    expect(unknown / known).toBeGreaterThan(0.6);
    expect(unknown / known).toBeLessThan(1.6);
  });

  it("gives a cookie that scripts and other sites cannot use, new at every sign-in", async () => {
    const { email, cookie } = await openAccount();
    const answer = await portal("auth/sign-in", { email, password: PASSWORD }, cookie).expect(200);
    const [set] = answer.headers["set-cookie"] as unknown as string[];
    // Without Secure, because the address of the tests is this very machine's.
    expect(set).toMatch(/^averduct_session=[\w-]{43}; Max-Age=1209600; Path=\/; HttpOnly; SameSite=Lax$/);
    expect(sessionOf(answer)).not.toBe(cookie);
  });

  it("does not take over a session that somebody else has set", async () => {
    const { email } = await openAccount();
    const planted = "averduct_session=planted-by-an-attacker";
    await portal("auth/sign-in", { email, password: PASSWORD }, planted).expect(200);
    await request(process.env.AVERDUCT_TEST_URL!).get("/api/portal/keys").set("Cookie", planted).expect(401);
  });

  it("stops an account from one address after too many failures, however right the password then is", async () => {
    const { email } = await openAccount();
    const from = freshAddress();
    for (let attempt = 0; attempt < 8; attempt += 1) await portal("auth/sign-in", { email, password: "not the password" }, undefined, from).expect(401);
    const stopped = await portal("auth/sign-in", { email, password: PASSWORD }, undefined, from).expect(429);
    expect(Number(stopped.headers["retry-after"])).toBeGreaterThan(0);
    // The count is the address's and the account's together; another account from here is not stopped.
    const other = await openAccount();
    await portal("auth/sign-in", { email: other.email, password: PASSWORD }, undefined, from).expect(200);
  });

  it("ends a session at sign-out", async () => {
    const { cookie } = await openAccount();
    await portal("auth/sign-out", undefined, cookie).expect(204);
    await request(process.env.AVERDUCT_TEST_URL!).get("/api/portal/keys").set("Cookie", cookie).expect(401);
  });
});

describe("resetting a password", () => {
  it("sets the new one, once, and ends every session", async () => {
    const { email, cookie } = await openAccount();
    await portal("auth/forgot-password", { email }).expect(202);
    const token = await tokenSentTo(email, "reset-password");
    expect((await portal("auth/reset-password", { token, password: "short" }).expect(422)).body.errors[0].pointer).toBe("/password");
    await portal("auth/reset-password", { token, password: "another set of words" }).expect(200);
    await portal("auth/reset-password", { token, password: "another set of words" }).expect(410);
    await request(process.env.AVERDUCT_TEST_URL!).get("/api/portal/keys").set("Cookie", cookie).expect(401);
    await portal("auth/sign-in", { email, password: "another set of words" }).expect(200);
  });

  it("says nothing of whether an address has an account", async () => {
    const { email } = await openAccount();
    const [unknown, known] = [await portal("auth/forgot-password", { email: freshEmail() }), await portal("auth/forgot-password", { email })];
    for (const answer of [unknown, known]) expect([answer.status, answer.body]).toEqual([202, {}]);
    expect(Object.keys(unknown.headers).sort()).toEqual(Object.keys(known.headers).sort());
  });

  it("refuses an expired link, and one that a newer took the place of", async () => {
    const { email } = await openAccount();
    await portal("auth/forgot-password", { email }).expect(202);
    const first = await tokenSentTo(email, "reset-password");
    await portal("auth/forgot-password", { email }).expect(202);
    const second = await vi.waitUntil(async () => {
      const newest = await tokenSentTo(email, "reset-password");
      return newest !== first && newest;
    }, { timeout: 5_000 });
    await portal("auth/reset-password", { token: first, password: "another set of words" }).expect(410);
    await testDatabase()("email_tokens").where({ token_hash: createHash("sha256").update(second).digest() }).update({ expires_at: new Date(Date.now() - 1_000) });
    await portal("auth/reset-password", { token: second, password: "another set of words" }).expect(410);
    await portal("auth/sign-in", { email, password: PASSWORD }).expect(200);
  });

  it("proves the address, and ends the link that would have", async () => {
    const email = freshEmail();
    await portal("auth/sign-up", { ...signUp, email }).expect(201);
    const confirmation = await tokenSentTo(email);
    await portal("auth/forgot-password", { email }).expect(202);
    await portal("auth/reset-password", { token: await tokenSentTo(email, "reset-password"), password: "another set of words" }).expect(200);
    await portal("auth/verify-email", { token: confirmation }).expect(410);
    const cookie = sessionOf(await portal("auth/sign-in", { email, password: "another set of words" }).expect(200));
    await portal("keys", keyRequest, cookie).expect(201);
  });

  it.each([
    ["its e-mail address", (email: string) => email.toUpperCase()],
    ["its name", () => "bram achterlund"],
  ])("does not take %s for a password", async (_, passwordOf) => {
    const { email } = await openAccount();
    await portal("auth/forgot-password", { email }).expect(202);
    const token = await tokenSentTo(email, "reset-password");
    expect((await portal("auth/reset-password", { token, password: passwordOf(email) }).expect(422)).body.errors[0].pointer).toBe("/password");
  });
});

describe("the audit log", () => {
  it("has who did what from where", async () => {
    const { email, cookie } = await openAccount();
    const from = freshAddress();
    await portal("auth/sign-in", { email, password: "not the password" }, undefined, from).expect(401);
    await portal("auth/sign-in", { email, password: PASSWORD }, undefined, from).expect(200);
    await portal("auth/sign-out", {}, cookie).expect(204);
    await portal("auth/forgot-password", { email }).expect(202);
    await portal("auth/reset-password", { token: await tokenSentTo(email, "reset-password"), password: "another set of words" }).expect(200);
    const user = await testDatabase()("users").where({ email }).first();
    const entries = await testDatabase()("audit_log").where({ actor_user_id: user.id }).orderBy("id");
    expect(entries.map(({ action }) => action)).toEqual(["sign_up", "email_verified", "sign_in_refused", "sign_in", "sign_out", "password_reset_asked", "password_reset"]);
    expect(entries[2]).toMatchObject({ subject: email, address: from });
    expect(entries[3]).toMatchObject({ subject: user.id, address: from });
  });
});

describe("changes from another site", () => {
  it.each<Record<string, string>>([{ Origin: "https://elsewhere.example" }, { Origin: "null" }, { "Sec-Fetch-Site": "cross-site" }, { "Sec-Fetch-Site": "same-site" }, { Origin: "http://localhost" }])("are refused: %o", async (headers) => {
    const { cookie } = await openAccount();
    const answer = await request(process.env.AVERDUCT_TEST_URL!).post("/api/portal/auth/sign-out").set("Cookie", cookie).set(headers).send();
    expect(answer.status).toBe(403);
    expect(answer.body.type).toMatch(/forbidden-origin$/);
  });
});

describe("keys in the portal", () => {
  it("are made, used, rotated with an overlap, and revoked", async () => {
    const { cookie } = await openAccount();
    const made = await portal("keys", keyRequest, cookie).expect(201);
    const call = (key: string): request.Test =>
      request(process.env.AVERDUCT_TEST_URL!).post("/api/v1/calculations/duct-area").set("Authorization", `Bearer ${key}`).send({ duct: { shape: "round", measured: "inside", diameter: { value: 14, unit: "in" } } });
    await call(made.body.text).expect(200);

    const successor = await portal(`keys/${made.body.id}/rotate`, { overlapHours: 1 }, cookie).expect(201);
    await call(made.body.text).expect(200);
    await call(successor.body.text).expect(200);
    await portal(`keys/${made.body.id}/rotate`, { overlapHours: 1 }, cookie).expect(422);

    await portal(`keys/${made.body.id}/revoke`, {}, cookie).expect(200);
    await new Promise((resolve) => setTimeout(resolve, 3_000));
    expect((await call(made.body.text).expect(401)).body.type).toMatch(/revoked-key$/);
    await call(successor.body.text).expect(200);
  });

  it("are never another organisation's", async () => {
    const [one, other] = [await openAccount(), await openAccount()];
    const { body } = await portal("keys", keyRequest, one.cookie).expect(201);
    await portal(`keys/${body.id}/revoke`, {}, other.cookie).expect(404);
    await portal(`keys/${body.id}/rotate`, { overlapHours: 1 }, other.cookie).expect(404);
  });

  it("are not a viewer's to make", async () => {
    const { email, cookie } = await openAccount();
    const user = await testDatabase()("users").where({ email }).first();
    await testDatabase()("memberships").where({ user_id: user.id }).update({ role: "viewer" });
    expect((await portal("keys", keyRequest, cookie).expect(403)).body.type).toMatch(/role-not-sufficient$/);
  });

  it.each([
    ["an unknown scope", { scopes: ["everything"] }, "/scopes/0"],
    ["no scope", { scopes: [] }, "/scopes"],
    ["a network that is none", { allowedNetworks: ["10.0.0.0/99"] }, "/allowedNetworks/0"],
  ])("refuse %s", async (_, change, pointer) => {
    const { cookie } = await openAccount();
    expect((await portal("keys", { ...keyRequest, ...change }, cookie).expect(422)).body.errors[0].pointer).toBe(pointer);
  });

  it("keep no secret in the database", async () => {
    const { cookie } = await openAccount();
    const { body } = await portal("keys", keyRequest, cookie).expect(201);
    const row = await testDatabase()("api_keys").where({ id: body.id }).first();
    const secret = body.text.split("_").at(-1).slice(0, 32);
    expect(JSON.stringify(row)).not.toContain(secret);
    expect(row.secret_hash).toHaveLength(32);
  });
});
