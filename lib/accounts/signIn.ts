import { RateLimiterRes, type RateLimiterMySQL } from "rate-limiter-flexible";
import { database } from "@/db/connection";
import { storedLimiter } from "@/lib/limits/storedLimiter";
import { Problem } from "@/lib/problems/problem";
import { callerAddress } from "@/lib/runtime/caller";
import { processWide } from "@/lib/runtime/processWide";
import { recordAudit } from "./audit";
import { isPassword } from "./password";
import { createSession } from "./session";

const QUARTER_HOUR = 900;

/**
 * Failed sign-ins are counted for an address, and for an account from an address. There is no count for an account
 * alone: with it, anybody could lock its owner out.
 */
const limiters = (): { account: RateLimiterMySQL; address: RateLimiterMySQL } =>
  processWide("signInLimiters", () => ({ account: storedLimiter(8, QUARTER_HOUR, "signin-account"), address: storedLimiter(60, QUARTER_HOUR, "signin-address") }));

/** Begins a session for the right e-mail and password; throws one and the same problem for any wrong pair. */
export async function signIn({ email, password }: { email: string; password: string }, userAgent: string): Promise<string> {
  const address = callerAddress() ?? "unknown";
  await requireAttemptsLeft(email, address);
  const user = await database()("users").where({ email }).first<{ id: string; password_hash: string } | undefined>("id", "password_hash");
  if (!(await isPassword(password, user?.password_hash))) {
    await countFailure(email, address);
    await recordAudit({ action: "sign_in_refused", actorUserId: user?.id, subject: email });
    const detail = "E-mail and password do not belong together.";
    throw new Problem("sign-in-refused", { detail, errors: [{ pointer: "/password", code: "sign_in_refused", detail }] });
  }
  await limiters().account.delete(`${email} ${address}`);
  await recordAudit({ action: "sign_in", actorUserId: user!.id, subject: user!.id });
  return createSession(user!.id, userAgent);
}

async function requireAttemptsLeft(email: string, address: string): Promise<void> {
  const { account, address: byAddress } = limiters();
  const states = await Promise.all([account.get(`${email} ${address}`), byAddress.get(address)]);
  for (const [index, limiter] of [account, byAddress].entries()) {
    const state = states[index];
    if (state && state.consumedPoints >= limiter.points) throw tooManyAttempts(state);
  }
}

async function countFailure(email: string, address: string): Promise<void> {
  const { account, address: byAddress } = limiters();
  const count = async (limiter: RateLimiterMySQL, key: string): Promise<void> => {
    await limiter.consume(key).catch((error: unknown) => {
      // The last attempt allowed has been used; the next one is refused before it is looked at.
      if (!(error instanceof RateLimiterRes)) throw error;
    });
  };
  await Promise.all([count(account, `${email} ${address}`), count(byAddress, address)]);
}

function tooManyAttempts({ msBeforeNext }: RateLimiterRes): Problem {
  const minutes = Math.max(1, Math.ceil(msBeforeNext / 60_000));
  const detail = `Too many failed attempts from your address. Try again in ${minutes} ${minutes === 1 ? "minute" : "minutes"}, or reset the password.`;
  return new Problem("too-many-attempts", { detail, errors: [{ pointer: "", code: "too_many_attempts", detail }], headers: { "Retry-After": String(Math.ceil(msBeforeNext / 1_000)) } });
}
