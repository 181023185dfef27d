import { get } from "node:http";
import { describe, expect, it } from "vitest";
import { testDatabase } from "../support/accounts";
import { api } from "../support/api";
import { freshEmail, openAccount, PASSWORD, portal, sessionOf, tokenSentTo } from "../support/portal";

/** Asks for a page under a host name of choice. */
const statusUnder = (host: string, path: string): Promise<number | undefined> =>
  new Promise((resolve, reject) => {
    get(`${process.env.AVERDUCT_TEST_URL}${path}`, { headers: { Host: host } }, (answer) => {
      answer.resume();
      resolve(answer.statusCode);
    }).on("error", reject);
  });

const policyOf = async (path: string): Promise<string | undefined> => (await api().get(path)).headers["content-security-policy"];
const nonceIn = (policy: string | undefined): string => /'nonce-([^']+)'/.exec(policy ?? "")![1]!;

describe("pages for those signed in", () => {
  it.each(["/overview", "/keys", "/admin"])("send somebody who is not from %s to sign in and back", async (path) => {
    const answer = await api().get(path).expect(307);
    expect(answer.headers.location).toBe(`/sign-in?next=${encodeURIComponent(path)}`);
  });

  it("do not let a caller's header say where to go on to", async () => {
    const answer = await api().get("/overview").set("x-path", "//elsewhere.example").expect(307);
    expect(answer.headers.location).toBe("/sign-in?next=%2Foverview");
  });

  it("send a member from the administrators' pages to their own", async () => {
    const { cookie } = await openAccount();
    expect((await api().get("/admin").set("Cookie", cookie).expect(307)).headers.location).toBe("/overview");
  });

  it("remind somebody whose address is not confirmed", async () => {
    const email = freshEmail();
    await portal("auth/sign-up", { email, name: "Sunniva Pell", organisation: "Slateboard Software", password: PASSWORD }).expect(201);
    const cookie = sessionOf(await portal("auth/sign-in", { email, password: PASSWORD }).expect(200))!;
    expect((await api().get("/overview").set("Cookie", cookie).expect(200)).text).toContain("Confirm your e-mail address");
    await testDatabase()("users").where({ email }).update({ email_verified_at: new Date() });
    expect((await api().get("/overview").set("Cookie", cookie).expect(200)).text).not.toContain("Confirm your e-mail address");
  });
});

describe("the sign-in page", () => {
  it("lets somebody who is signed in go on", async () => {
    const { cookie } = await openAccount();
    expect((await api().get("/sign-in?next=/usage").set("Cookie", cookie).expect(307)).headers.location).toBe("/usage");
    expect((await api().get("/sign-in?next=/%09/elsewhere.example").set("Cookie", cookie).expect(307)).headers.location).toBe("/overview");
  });

  it("says so to somebody who belongs to no organisation, rather than sending them in circles", async () => {
    const { email, cookie } = await openAccount();
    const user = await testDatabase()("users").where({ email }).first();
    await testDatabase()("memberships").where({ user_id: user.id }).delete();
    expect((await api().get("/overview").set("Cookie", cookie).expect(307)).headers.location).toMatch(/^\/sign-in/);
    expect((await api().get("/sign-in").set("Cookie", cookie).expect(200)).text).toContain("belongs to no organisation");
  });
});

describe("a link from an e-mail", () => {
  it("is not used up by a program that only looks at it", async () => {
    const { email } = await openAccount();
    await portal("auth/forgot-password", { email }).expect(202);
    const token = await tokenSentTo(email, "reset-password");
    await api().get(`/reset-password?token=${token}`).expect(200);
    await portal("auth/reset-password", { token, password: "another set of words" }).expect(200);
  });
});

describe("the local mailbox", () => {
  it("is there under this machine's own names, and under no other", async () => {
    const port = new URL(process.env.AVERDUCT_TEST_URL!).port;
    expect(await statusUnder(`localhost:${port}`, "/mailbox")).toBe(200);
    expect(await statusUnder(`127.0.0.1:${port}`, "/mailbox")).toBe(200);
    expect(await statusUnder("elsewhere.example", "/mailbox")).toBe(404);
  });
});

describe("the content security policy of pages", () => {
  it("has a nonce of its own for every request, which every script carries", async () => {
    const answer = await api().get("/sign-in").expect(200);
    const policy = answer.headers["content-security-policy"];
    const nonce = nonceIn(policy);
    const scripts = answer.text.match(/<script\b[^>]*>/g)!;
    expect(scripts.length).toBeGreaterThan(3);
    for (const script of scripts) expect(script).toContain(`nonce="${nonce}"`);
    expect(nonceIn(await policyOf("/sign-in"))).not.toBe(nonce);
    expect(policy).toMatch(/script-src 'self' 'nonce-[^']+' 'strict-dynamic';/);
    expect(policy).toMatch(/object-src 'none'; base-uri 'self'; form-action 'self'; frame-ancestors 'none'$/);
  });

  it("is looser for the reference alone", async () => {
    expect(await policyOf("/docs/reference")).toContain("script-src 'self' 'unsafe-inline'");
    for (const path of ["/", "/docs", "/docs/referenced", "/mailbox", "/nowhere"]) expect(await policyOf(path), path).not.toMatch(/script-src[^;]*'unsafe-inline'/);
  });

  it.each(["/api/healthz", "/api/v1/openapi.json", "/api/portal/keys", "/robots.txt", "/icon.svg"])("does not cost %s a pass through it", async (path) => {
    expect(await policyOf(path)).toBeUndefined();
  });
});

describe("the portal's own routes", () => {
  it.each([["get", "/api/portal/auth/sign-in", 405], ["delete", "/api/portal/account/password", 405], ["post", "/api/portal/nowhere", 404]] as const)("%s %s is a problem", async (method, path, status) => {
    const answer = await api()[method](path).expect(status);
    expect(answer.headers["content-type"]).toBe("application/problem+json");
    expect(answer.body.requestId).toBe(answer.headers["request-id"]);
  });

  it("keep their answers to whoever asked", async () => {
    const { cookie } = await openAccount();
    const { headers } = await api().get("/api/portal/account/sessions").set("Cookie", cookie).expect(200);
    expect(headers).toMatchObject({ "cache-control": "no-store", "x-content-type-options": "nosniff", "request-id": expect.stringMatching(/^req_/) });
  });
});
