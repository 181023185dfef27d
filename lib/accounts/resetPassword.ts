import { database } from "@/db/connection";
import { sendMail } from "@/lib/mail/sendMail";
import { Problem } from "@/lib/problems/problem";
import { config } from "@/lib/runtime/config";
import { recordAudit } from "./audit";
import { createEmailToken, redeemEmailToken } from "./emailToken";
import { hashPassword, passwordFault } from "./password";

/** Sends a reset link where the address has an account; says nothing either way. */
export async function askForReset(email: string): Promise<void> {
  const user = await database()("users").where({ email }).first<{ id: string } | undefined>("id");
  if (!user) return;
  const token = await createEmailToken(user.id, "reset_password");
  await recordAudit({ action: "password_reset_asked", actorUserId: user.id, subject: user.id });
  await sendMail({
    to: email,
    subject: "Set a new password",
    text: `Open this page and choose a new password. The link is good for one hour, once.\n\n${config().AVERDUCT_URL}/reset-password?token=${token}\n\nIf you did not ask for it, do nothing; your password stays as it is.`,
  });
}

/** Sets a new password through a link and ends every session the person had. */
export async function resetPassword({ token, password }: { token: string; password: string }): Promise<void> {
  await database().transaction(async (db) => {
    const userId = await redeemEmailToken(token, "reset_password", db);
    const user = await db("users").where({ id: userId }).first<{ email: string; name: string }>("email", "name");
    const fault = passwordFault(password, user!);
    // Thrown inside the transaction, so that the link stays good for another try.
    if (fault) throw new Problem("invalid-request", { detail: fault, errors: [{ pointer: "/password", code: "password_not_accepted", detail: fault }] });
    const passwordHash = await hashPassword(password);
    await db("users").where({ id: userId }).update({ password_hash: passwordHash, email_verified_at: db.raw("COALESCE(email_verified_at, NOW(3))") });
    await db("sessions").where({ user_id: userId }).delete();
    await recordAudit({ action: "password_reset", actorUserId: userId, subject: userId }, db);
  });
}
