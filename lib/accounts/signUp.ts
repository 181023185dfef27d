import { database } from "@/db/connection";
import { newId } from "@/lib/ids/newId";
import { sendMail } from "@/lib/mail/sendMail";
import { Problem } from "@/lib/problems/problem";
import { config } from "@/lib/runtime/config";
import { recordAudit } from "./audit";
import { createEmailToken } from "./emailToken";
import { hashPassword, passwordFault } from "./password";

export interface SignUpInput {
  email: string;
  name: string;
  organisation: string;
  password: string;
}

const FIRST_PLAN = "trial";

/**
 * Opens an account: a person and their organisation. For an e-mail that is known already the answer is the same, and
 * the owner of the address is told by e-mail, so that nobody learns who has an account.
 */
export async function signUp(input: SignUpInput): Promise<void> {
  const fault = passwordFault(input.password, input);
  if (fault) throw new Problem("invalid-request", { detail: fault, errors: [{ pointer: "/password", code: "password_not_accepted", detail: fault }] });

  const passwordHash = await hashPassword(input.password);
  if (await database()("users").where({ email: input.email }).first("id")) {
    await sendMail(alreadyKnown(input.email));
    return;
  }
  const userId = newId("usr");
  const organisationId = newId("org");
  await database().transaction(async (db) => {
    await db("users").insert({ id: userId, email: input.email, name: input.name, password_hash: passwordHash });
    await db("organisations").insert({ id: organisationId, name: input.organisation, plan_id: FIRST_PLAN });
    await db("memberships").insert({ organisation_id: organisationId, user_id: userId, role: "owner" });
    await recordAudit({ action: "sign_up", organisationId, actorUserId: userId, subject: userId }, db);
  });
  await sendVerification(userId, input.email);
}

/** Sends the link that proves an e-mail address is the person's own. */
export async function sendVerification(userId: string, email: string): Promise<void> {
  const token = await createEmailToken(userId, "verify_email");
  await sendMail({
    to: email,
    subject: "Confirm your e-mail address",
    text: `Open this page and press Confirm. The link is good for three days, once.\n\n${config().AVERDUCT_URL}/verify-email?token=${token}\n\nIf you did not open an account with Averduct, do nothing.`,
  });
}

const alreadyKnown = (email: string) => ({
  to: email,
  subject: "You have an account already",
  text: `Somebody, perhaps you, tried to open an account with this address. It has one already.\n\nSign in: ${config().AVERDUCT_URL}/sign-in\nForgotten the password: ${config().AVERDUCT_URL}/forgot-password\n\nIf it was not you, do nothing.`,
});
