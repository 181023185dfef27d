import { createHash } from "node:crypto";
import type request from "supertest";
import { describe, expect, it } from "vitest";
import { testDatabase } from "../support/accounts";
import { api } from "../support/api";
import { freshAddress, mailTo, openAccount, PASSWORD, portal, sessionOf } from "../support/portal";

const MINUTE_MS = 60_000;
const DAY_MS = 24 * 60 * MINUTE_MS;

const rowOf = (cookie: string) => testDatabase()("sessions").where({ token_hash: createHash("sha256").update(cookie.split("=")[1]!).digest() });
const isGood = async (cookie: string): Promise<boolean> => (await api().get("/api/portal/account/sessions").set("Cookie", cookie)).status === 200;
const sessionsOf = async (cookie: string): Promise<{ id: string; current: boolean; userAgent: string; address: string }[]> =>
  (await api().get("/api/portal/account/sessions").set("Cookie", cookie).expect(200)).body.items;
const anotherSession = async (email: string): Promise<string> => sessionOf(await portal("auth/sign-in", { email, password: PASSWORD }).expect(200))!;

describe("a session", () => {
  it("is kept as a hash of 256 random bits", async () => {
    const { cookie } = await openAccount();
    const token = cookie.split("=")[1]!;
    expect(Buffer.from(token, "base64url")).toHaveLength(32);
    const row = await rowOf(cookie).first();
    expect(JSON.stringify(row)).not.toContain(token);
  });

  it("gives way to the new one at sign-in, and to no other", async () => {
    const { email, cookie } = await openAccount();
    const elsewhere = await anotherSession(email);
    const renewed = sessionOf(await portal("auth/sign-in", { email, password: PASSWORD }, cookie).expect(200))!;
    expect(renewed).not.toBe(cookie);
    expect([await isGood(cookie), await isGood(renewed), await isGood(elsewhere)]).toEqual([false, true, true]);
  });

  it("stays as it is when a sign-in is refused", async () => {
    const { email, cookie } = await openAccount();
    await portal("auth/sign-in", { email, password: "not the password" }, cookie).expect(401);
    expect(await isGood(cookie)).toBe(true);
  });

  it("ends at its term", async () => {
    const { cookie } = await openAccount();
    await rowOf(cookie).update({ expires_at: new Date(Date.now() - 1_000) });
    expect(await isGood(cookie)).toBe(false);
  });

  it("ends when it was not used for days", async () => {
    const { cookie } = await openAccount();
    await rowOf(cookie).update({ last_seen_at: new Date(Date.now() - 3 * DAY_MS + MINUTE_MS) });
    expect(await isGood(cookie)).toBe(true);
    await rowOf(cookie).update({ last_seen_at: new Date(Date.now() - 3 * DAY_MS - MINUTE_MS) });
    expect(await isGood(cookie)).toBe(false);
  });

  it("notes its use once a minute at most", async () => {
    const { cookie } = await openAccount();
    const seenAfterUse = async (agoMs: number): Promise<number> => {
      const before = new Date(Date.now() - agoMs);
      await rowOf(cookie).update({ last_seen_at: before });
      await isGood(cookie);
      return (await rowOf(cookie).first()).last_seen_at.getTime() - before.getTime();
    };
    expect(await seenAfterUse(30_000)).toBe(0);
    expect(await seenAfterUse(90_000)).toBeGreaterThan(80_000);
  });

  it.each(["averduct_session=", `averduct_session=${"x".repeat(5_000)}`, "averduct_session=%00", "averduct_session==;averduct_session=a"])("is none with the cookie %.40s", async (cookie) => {
    expect((await api().get("/api/portal/account/sessions").set("Cookie", cookie).expect(401)).body.type).toMatch(/not-signed-in$/);
  });

  it("is signed out of with the cookie taken away, also when it has ended already", async () => {
    const { cookie } = await openAccount();
    for (const _ of [1, 2]) {
      const answer = await portal("auth/sign-out", {}, cookie).expect(204);
      expect(answer.headers["set-cookie"]![0]).toMatch(/^averduct_session=; Max-Age=0; Path=\/; HttpOnly; SameSite=Lax$/);
    }
    expect(await isGood(cookie)).toBe(false);
  });
});

describe("the list of one's sessions", () => {
  it("says which is which, and ends another", async () => {
    const { email, cookie } = await openAccount();
    const elsewhere = sessionOf(await portal("auth/sign-in", { email, password: PASSWORD }).set("User-Agent", "Field tablet").expect(200))!;
    const items = await sessionsOf(cookie);
    expect(items.map(({ current }) => current).sort()).toEqual([false, true]);
    const other = items.find(({ current }) => !current)!;
    expect(other.userAgent).toBe("Field tablet");
    expect(other.address).toMatch(/^127\./);
    await portal(`account/sessions/${other.id}/end`, {}, cookie).expect(204);
    expect([await isGood(elsewhere), await isGood(cookie)]).toEqual([false, true]);
  });

  it("shows and ends nobody else's", async () => {
    const [one, other] = [await openAccount(), await openAccount()];
    const [theirs] = await sessionsOf(other.cookie);
    expect((await sessionsOf(one.cookie)).map(({ id }) => id)).not.toContain(theirs!.id);
    await portal(`account/sessions/${theirs!.id}/end`, {}, one.cookie).expect(404);
    expect(await isGood(other.cookie)).toBe(true);
  });
});

describe("changing a password", () => {
  const change = (cookie: string, currentPassword: string, newPassword: string): request.Test => portal("account/password", { currentPassword, newPassword }, cookie);

  it("ends the other sessions and the links sent before, and tells by e-mail", async () => {
    const { email, cookie } = await openAccount();
    const elsewhere = await anotherSession(email);
    await portal("auth/forgot-password", { email }).expect(202);
    const { body } = await mailTo(email, "/reset-password?token=");
    await change(cookie, PASSWORD, "another set of words").expect(204);
    expect([await isGood(cookie), await isGood(elsewhere)]).toEqual([true, false]);
    await portal("auth/reset-password", { token: /token=([\w-]+)/.exec(body)![1], password: "yet another set" }).expect(410);
    await portal("auth/sign-in", { email, password: PASSWORD }).expect(401);
    await portal("auth/sign-in", { email, password: "another set of words" }).expect(200);
    await mailTo(email, "was changed");
  });

  it.each([
    ["the wrong current password", "not the password", "another set of words", "/currentPassword"],
    ["a short new one", PASSWORD, "short", "/newPassword"],
  ])("is refused with %s, beside its field", async (_, currentPassword, newPassword, pointer) => {
    const { cookie } = await openAccount();
    expect((await change(cookie, currentPassword, newPassword).expect(422)).body.errors[0].pointer).toBe(pointer);
  });

  it("takes as many guesses at the current one as signing in", async () => {
    const { cookie } = await openAccount();
    const from = freshAddress();
    const guess = (): request.Test => portal("account/password", { currentPassword: "not the password", newPassword: "another set of words" }, cookie, from);
    for (let attempt = 0; attempt < 8; attempt += 1) await guess().expect(422);
    await guess().expect(429);
  });
});
