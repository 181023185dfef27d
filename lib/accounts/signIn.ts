import { database } from "@/db/connection";
import { Problem } from "@/lib/problems/problem";
import { callerNetwork, giveBack, renew, spend } from "./allowance";
import { recordAudit } from "./audit";
import { isPassword } from "./password";
import { createSession, type Visit } from "./session";

/** Begins a session for the right e-mail and password; throws one and the same problem for any wrong pair. */
export async function signIn({ email, password }: { email: string; password: string }, visit: Visit): Promise<string> {
  const network = callerNetwork();
  await spend("signIn", network);
  await spend("signInToAccount", email, network);
  const user = await database()("users").where({ email }).first<{ id: string; password_hash: string } | undefined>("id", "password_hash");
  const fits = await isPassword(password, user?.password_hash);
  if (!user || !fits) {
    await recordAudit({ action: "sign_in_refused", actorUserId: user?.id, subject: email });
    const detail = "E-mail and password do not belong together.";
    throw new Problem("sign-in-refused", { detail, errors: [{ pointer: "/password", code: "sign_in_refused", detail }] });
  }
  // Only failures count.
  await Promise.all([giveBack("signIn", network), renew("signInToAccount", email, network)]);
  await recordAudit({ action: "sign_in", actorUserId: user.id, subject: user.id });
  return createSession(user.id, visit);
}
