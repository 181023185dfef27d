import { database } from "@/db/connection";
import { sendMail } from "@/lib/mail/sendMail";
import { inBackground } from "@/lib/runtime/background";
import { callerNetwork, maySpend, renew, spend } from "./allowance";
import { recordAudit } from "./audit";
import { createEmailToken, ownerOfEmailToken, redeemEmailToken } from "./emailToken";
import { passwordChanged, resetLink } from "./letters";
import { hashPassword, requireUnlike } from "./password";
import { setPassword } from "./setPassword";

/** Sends a reset link where the address has an account; neither the answer nor its duration says whether it has. */
export async function askForReset(email: string): Promise<void> {
  await spend("askForReset", callerNetwork());
  const user = await database()("users").where({ email }).first<{ id: string } | undefined>("id");
  if (user) inBackground("a reset link", () => sendResetLink(user.id, email));
}

async function sendResetLink(userId: string, email: string): Promise<void> {
  // Before the token: a new one ends the earlier, which must stay good when no e-mail follows.
  if (!(await maySpend("mail", email))) return;
  const token = await createEmailToken(userId, "reset_password");
  await recordAudit({ action: "password_reset_asked", actorUserId: userId, subject: userId });
  await sendMail(resetLink(email, token));
}

/** Sets a new password through a link, which also proves the address, and ends every session the person had. */
export async function resetPassword({ token, password }: { token: string; password: string }): Promise<void> {
  const userId = await ownerOfEmailToken(token, "reset_password");
  const user = (await database()("users").where({ id: userId }).first<{ email: string; name: string }>("email", "name"))!;
  requireUnlike(user, password);
  // Outside the transaction: waiting in line to hash must not hold a connection.
  const passwordHash = await hashPassword(password);
  await database().transaction(async (db) => {
    await redeemEmailToken(token, "reset_password", db);
    await db("users").where({ id: userId, email_verified_at: null }).update({ email_verified_at: new Date() });
    await setPassword(userId, passwordHash, db);
    await recordAudit({ action: "password_reset", actorUserId: userId, subject: userId }, db);
  });
  await renew("signInToAccount", user.email, callerNetwork());
  inBackground("the notice of a new password", () => sendMail(passwordChanged(user.email)));
}
