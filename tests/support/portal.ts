import { randomInt } from "node:crypto";
import { Agent } from "node:http";
import request from "supertest";
import { testDatabase } from "./accounts";

const ORIGIN = (): string => process.env.AVERDUCT_TEST_URL!;
let counter = 0;

/** An e-mail address nobody else uses. */
export const freshEmail = (): string => `person-${Date.now()}-${(counter += 1)}@slateboard.example`;

export const PASSWORD = "plenum damper gauge ladder";

/** An address of this machine that nobody else calls from: all of 127.0.0.0/8 is loopback on Linux. */
export const freshAddress = (): string => `127.${randomInt(1, 255)}.${randomInt(256)}.${randomInt(1, 255)}`;

/** Posts to one of the portal's own routes as its pages do, by default from an address of its own, so that one test does not use up another's attempts. */
export function portal(path: string, body: object | undefined = {}, cookie?: string, from = freshAddress()): request.Test {
  const call = request(ORIGIN()).post(`/api/portal/${path}`).set("Origin", ORIGIN()).agent(new Agent({ localAddress: from, family: 4 }));
  if (cookie) call.set("Cookie", cookie);
  return call.send(body);
}

/** The session cookie an answer sets, as a request sends it back; undefined where it sets none. */
export const sessionOf = (answer: request.Response): string | undefined => (answer.headers["set-cookie"] as unknown as string[] | undefined)?.[0]?.split(";")[0];

/** The newest e-mail to an address whose text has a passage, once it is there. */
export async function mailTo(email: string, passage: string): Promise<{ subject: string; body: string }> {
  for (let attempt = 0; attempt < 50; attempt += 1) {
    const mail = await testDatabase()("local_mailbox").where({ recipient: email }).where("body", "like", `%${passage}%`).orderBy("id", "desc").first();
    if (mail) return mail;
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  throw new Error(`no e-mail to ${email} with "${passage}"`);
}

/** The token in the newest e-mail to an address that links to a page. */
export async function tokenSentTo(email: string, page: "verify-email" | "reset-password" = "verify-email"): Promise<string> {
  const { body } = await mailTo(email, `/${page}?token=`);
  return /token=([\w-]+)/.exec(body)![1]!;
}

/** Opens an account, confirms its e-mail and returns the session. */
export async function openAccount(email = freshEmail()): Promise<{ email: string; cookie: string }> {
  await portal("auth/sign-up", { email, name: "Bram Achterlund", organisation: "Slateboard Software", password: PASSWORD }).expect(201);
  const answer = await portal("auth/verify-email", { token: await tokenSentTo(email) }).expect(200);
  return { email, cookie: sessionOf(answer)! };
}
