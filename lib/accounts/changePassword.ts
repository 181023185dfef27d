import { database } from "@/db/connection";
import { sendMail } from "@/lib/mail/sendMail";
import { Problem } from "@/lib/problems/problem";
import { inBackground } from "@/lib/runtime/background";
import { callerNetwork, renew, spend } from "./allowance";
import { recordAudit } from "./audit";
import { passwordChanged } from "./letters";
import { hashPassword, isPassword, requireUnlike } from "./password";
import type { SignedIn } from "./session";
import { setPassword } from "./setPassword";

/** Changes the password of somebody who knows the current one, and ends their other sessions. */
export async function changePassword(person: SignedIn, { currentPassword, newPassword }: { currentPassword: string; newPassword: string }): Promise<void> {
  const { userId, email, sessionId, organisation } = person;
  requireUnlike(person, newPassword, "/newPassword");
  await spend("signInToAccount", email, callerNetwork());
  const user = await database()("users").where({ id: userId }).first<{ password_hash: string } | undefined>("password_hash");
  if (!(await isPassword(currentPassword, user?.password_hash))) {
    const detail = "This is not the current password.";
    throw new Problem("invalid-request", { detail, errors: [{ pointer: "/currentPassword", code: "password_wrong", detail }] });
  }
  const passwordHash = await hashPassword(newPassword);
  await database().transaction(async (db) => {
    await setPassword(userId, passwordHash, db, sessionId);
    await recordAudit({ action: "password_changed", organisationId: organisation?.id, actorUserId: userId, subject: userId }, db);
  });
  await renew("signInToAccount", email, callerNetwork());
  inBackground("the notice of a new password", () => sendMail(passwordChanged(email)));
}
