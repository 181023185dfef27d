import { describe, expect, it, vi } from "vitest";
import { testDatabase } from "../support/accounts";
import { freshAddress, freshEmail, openAccount, PASSWORD, portal, tokenSentTo } from "../support/portal";

const times = (count: number): number[] => Array.from({ length: count }, (_, index) => index);
const statusOf = async (call: ReturnType<typeof portal>): Promise<number> => (await call).status;
const count = (statuses: number[], status: number): number => statuses.filter((one) => one === status).length;

const wrongGuess = (email: string, from: string): ReturnType<typeof portal> => portal("auth/sign-in", { email, password: "not the password" }, undefined, from);
const rightGuess = (email: string, from: string): ReturnType<typeof portal> => portal("auth/sign-in", { email, password: PASSWORD }, undefined, from);
const signUp = (email: string, from: string): ReturnType<typeof portal> =>
  portal("auth/sign-up", { email, name: "Sunniva Pell", organisation: "Slateboard Software", password: PASSWORD }, undefined, from);

describe("guessing a password", () => {
  it("gets no more tries at once than in a row", async () => {
    const { email } = await openAccount();
    const from = freshAddress();
    const statuses = await Promise.all(times(30).map(() => statusOf(wrongGuess(email, from))));
    expect([count(statuses, 401), count(statuses, 429)]).toEqual([8, 22]);
  });

  it("does not keep the owner out who comes from another address", async () => {
    const { email } = await openAccount();
    const [attacker, owner] = [freshAddress(), freshAddress()];
    for (const _ of times(12)) await wrongGuess(email, attacker);
    await rightGuess(email, attacker).expect(429);
    await rightGuess(email, owner).expect(200);
    // And the owner's success does not give the attacker another try.
    await wrongGuess(email, attacker).expect(429);
  });

  it("ends for an address that tries one account after the other, and for no other address", async () => {
    const { email } = await openAccount();
    const [attacker, other] = [freshAddress(), freshAddress()];
    const statuses = await Promise.all(times(70).map(() => statusOf(wrongGuess(freshEmail(), attacker))));
    expect([count(statuses, 401), count(statuses, 429)]).toEqual([60, 10]);
    const stopped = await rightGuess(email, attacker).expect(429);
    expect(Number(stopped.headers["retry-after"])).toBeLessThanOrEqual(900);
    await rightGuess(email, other).expect(200);
  });

  it("counts failures only", async () => {
    const { email } = await openAccount();
    const from = freshAddress();
    for (const _ of times(65)) await rightGuess(email, from).expect(200);
  });

  it("may go on after the owner has set a new password", async () => {
    const { email } = await openAccount();
    const from = freshAddress();
    for (const _ of times(9)) await wrongGuess(email, from);
    await rightGuess(email, from).expect(429);
    await portal("auth/forgot-password", { email }, undefined, from).expect(202);
    await portal("auth/reset-password", { token: await tokenSentTo(email, "reset-password"), password: "another set of words" }, undefined, from).expect(200);
    await portal("auth/sign-in", { email, password: "another set of words" }, undefined, from).expect(200);
  });

  it("is refused for the longest address as for any other", async () => {
    const domain = `${"d".repeat(60)}.${"e".repeat(60)}.${"f".repeat(60)}.example`;
    const email = `${"a".repeat(253 - domain.length)}@${domain}`;
    expect(email).toHaveLength(254);
    await wrongGuess(email, freshAddress()).expect(401);
  });
});

describe("opening accounts", () => {
  it("ends for an address after sixty within the hour, and for no other", async () => {
    const from = freshAddress();
    const statuses = await Promise.all(times(63).map(() => statusOf(signUp(freshEmail(), from))));
    expect([count(statuses, 201), count(statuses, 429)]).toEqual([60, 3]);
    await signUp(freshEmail(), freshAddress()).expect(201);
  });

  it("makes one account where several sign up with an address at once", async () => {
    const email = freshEmail();
    const statuses = await Promise.all(times(5).map(() => statusOf(signUp(email, freshAddress()))));
    expect(statuses).toEqual([201, 201, 201, 201, 201]);
    const users = await testDatabase()("users").where({ email });
    expect(users).toHaveLength(1);
    expect(await testDatabase()("memberships").where({ user_id: users[0].id })).toHaveLength(1);
  });
});

describe("asking for e-mails", () => {
  it("sends six to a recipient within the hour, and the last of them stays good", async () => {
    const { email } = await openAccount();
    const received = async (): Promise<number> => (await testDatabase()("local_mailbox").where({ recipient: email })).length;
    // The confirmation was the first.
    for (const asked of times(8)) {
      await portal("auth/forgot-password", { email }).expect(202, {});
      await vi.waitUntil(async () => (await received()) === Math.min(asked + 2, 6), { timeout: 5_000 });
    }
    await new Promise((resolve) => setTimeout(resolve, 300));
    expect(await received()).toBe(6);
    const token = await tokenSentTo(email, "reset-password");
    await portal("auth/reset-password", { token, password: "another set of words" }).expect(200);
  });

  it("says so to somebody signed in who asks for the confirmation again and again", async () => {
    const email = freshEmail();
    const from = freshAddress();
    await signUp(email, from).expect(201);
    const cookie = (await rightGuess(email, from).expect(200)).headers["set-cookie"]![0]!.split(";")[0];
    await tokenSentTo(email);
    for (const _ of times(5)) await portal("auth/resend-verification", {}, cookie).expect(202);
    await portal("auth/resend-verification", {}, cookie).expect(429);
  });
});
