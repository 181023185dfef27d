import { createHash } from "node:crypto";
import ipaddr from "ipaddr.js";
import { RateLimiterRes, type RateLimiterMySQL } from "rate-limiter-flexible";
import { storedLimiter } from "@/lib/limits/storedLimiter";
import { type Problem, refusal } from "@/lib/problems/problem";
import { callerAddress } from "@/lib/runtime/caller";
import { processWide } from "@/lib/runtime/processWide";

const QUARTER_HOUR = 900;
const HOUR = 3_600;
/** Who owns one IPv6 address owns at least the 64 bits after the network. */
const IPV6_NETWORK_BITS = 64;

/** What may be tried how often. No sign-in is counted for an account alone: with that, anybody could lock its owner out. */
const ALLOWANCES = {
  /** Failed sign-ins to one account from one network. */
  signInToAccount: { times: 8, seconds: QUARTER_HOUR },
  /** Failed sign-ins from one network. */
  signIn: { times: 60, seconds: QUARTER_HOUR },
  signUp: { times: 60, seconds: HOUR },
  askForReset: { times: 60, seconds: HOUR },
  /** E-mails to one recipient. */
  mail: { times: 6, seconds: HOUR },
} as const;

type Allowance = keyof typeof ALLOWANCES;

const limiter = (name: Allowance): RateLimiterMySQL =>
  processWide(`allowance.${name}`, () => storedLimiter(ALLOWANCES[name].times, ALLOWANCES[name].seconds, name));

/** A digest, because an e-mail address may be longer than the table's key. */
const keyOf = (whose: string[]): string => createHash("sha256").update(whose.join(" ")).digest("base64url");

/** The caller's network, for what is counted by where it comes from. */
export function callerNetwork(): string {
  const address = callerAddress();
  if (!address || !ipaddr.isValid(address)) return "unknown";
  const parsed = ipaddr.process(address);
  return parsed.kind() === "ipv4" ? parsed.toString() : ipaddr.IPv6.networkAddressFromCIDR(`${parsed}/${IPV6_NETWORK_BITS}`).toString();
}

/**
 * Spends one time of an allowance before what it is for is looked at, so that many tries at once get no more than
 * many in a row. Throws the problem when it is used up.
 */
export async function spend(name: Allowance, ...whose: string[]): Promise<void> {
  const refused = await trySpending(name, whose);
  if (refused) throw tooManyAttempts(refused);
}

/** Like `spend`, but says whether there was one left. */
export const maySpend = async (name: Allowance, ...whose: string[]): Promise<boolean> => (await trySpending(name, whose)) === null;

/** Gives back a time that did not count after all. */
export const giveBack = async (name: Allowance, ...whose: string[]): Promise<void> => void (await limiter(name).reward(keyOf(whose), 1));

/** Starts an allowance anew. */
export const renew = async (name: Allowance, ...whose: string[]): Promise<void> => void (await limiter(name).delete(keyOf(whose)));

async function trySpending(name: Allowance, whose: string[]): Promise<RateLimiterRes | null> {
  try {
    await limiter(name).consume(keyOf(whose));
    return null;
  } catch (error) {
    if (error instanceof RateLimiterRes) return error;
    throw error;
  }
}

function tooManyAttempts({ msBeforeNext }: RateLimiterRes): Problem {
  const seconds = Math.max(1, Math.ceil(msBeforeNext / 1_000));
  const minutes = Math.ceil(seconds / 60);
  return refusal("too-many-attempts", `There were too many attempts. Try again in ${minutes} ${minutes === 1 ? "minute" : "minutes"}.`, {}, { "Retry-After": String(seconds) });
}
