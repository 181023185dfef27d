import { setTimeout as pause } from "node:timers/promises";
import { database } from "@/db/connection";
import { newId } from "@/lib/ids/newId";
import { sendMail } from "@/lib/mail/sendMail";
import { inBackground } from "@/lib/runtime/background";
import { callerNetwork, maySpend, spend } from "./allowance";
import { recordAudit } from "./audit";
import { createEmailToken } from "./emailToken";
import { alreadyKnown, confirmAddress } from "./letters";
import { hashPassword, requireUnlike } from "./password";

export interface SignUpInput {
  email: string;
  name: string;
  organisation: string;
  password: string;
}

const FIRST_PLAN = "trial";
/** Well above what storing an account takes, so that the time of the answer does not tell whether one was stored. */
const LEAST_MS = 150;

/**
 * Opens an account: a person and their organisation. For an e-mail that is known already the answer is the same, and
 * the owner of the address is told by e-mail, so that nobody learns who has an account.
 */
export async function signUp(input: SignUpInput): Promise<void> {
  requireUnlike(input, input.password);
  await spend("signUp", callerNetwork());
  const passwordHash = await hashPassword(input.password);
  const [userId] = await Promise.all([storeAccount(input, passwordHash), pause(LEAST_MS)]);
  inBackground("the e-mail after a sign-up", async () => {
    if (!(await maySpend("mail", input.email))) return;
    await (userId ? sendVerification(userId, input.email) : sendMail(alreadyKnown(input.email)));
  });
}

/** Returns the new person's id; null where the e-mail is known already, also when two sign up with it at once. */
async function storeAccount({ email, name, organisation }: SignUpInput, passwordHash: string): Promise<string | null> {
  const userId = newId("usr");
  const organisationId = newId("org");
  try {
    await database().transaction(async (db) => {
      await db("users").insert({ id: userId, email, name, password_hash: passwordHash });
      await db("organisations").insert({ id: organisationId, name: organisation, plan_id: FIRST_PLAN });
      await db("memberships").insert({ organisation_id: organisationId, user_id: userId, role: "owner" });
      await recordAudit({ action: "sign_up", organisationId, actorUserId: userId, subject: userId }, db);
    });
    return userId;
  } catch (error) {
    if (error instanceof Error && "code" in error && error.code === "ER_DUP_ENTRY") return null;
    throw error;
  }
}

/** Sends the link that proves an e-mail address is the person's own. */
export async function sendVerification(userId: string, email: string): Promise<void> {
  const token = await createEmailToken(userId, "verify_email");
  await sendMail(confirmAddress(email, token));
}
