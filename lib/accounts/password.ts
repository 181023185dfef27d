import { hash, verify } from "@node-rs/argon2";
import { processWide } from "@/lib/runtime/processWide";

/** argon2id, the package's default algorithm, with the parameters that OWASP recommends at least. */
const PARAMETERS = { memoryCost: 19 * 1024, timeCost: 2, parallelism: 1 };
/** Hashing takes a core for some milliseconds; a burst of sign-ins waits in line rather than starving the API. */
const AT_ONCE = 2;

const LEAST_LENGTH = 10;
const MOST_LENGTH = 200;
/** The commonest of the passwords that are long enough. */
const COMMON = new Set(["1234567890", "12345678910", "123456789a", "qwertyuiop", "password12", "password123", "passwordpassword", "1q2w3e4r5t", "q1w2e3r4t5", "iloveyou123", "administrator", "letmein123", "0123456789", "9876543210", "aaaaaaaaaa", "1111111111", "0000000000", "abcdefghij", "qwerty12345", "welcome123"]);

interface Line {
  running: number;
  waiting: (() => void)[];
}
const line = (): Line => processWide("passwordLine", () => ({ running: 0, waiting: [] }));

async function inLine<T>(work: () => Promise<T>): Promise<T> {
  const state = line();
  if (state.running >= AT_ONCE) await new Promise<void>((resolve) => state.waiting.push(resolve));
  state.running += 1;
  try {
    return await work();
  } finally {
    state.running -= 1;
    state.waiting.shift()?.();
  }
}

export const hashPassword = (password: string): Promise<string> => inLine(() => hash(password, PARAMETERS));

/** A hash that no password fits, so that an unknown e-mail costs the same time as a wrong password. */
const nobody = (): Promise<string> => processWide("nobodyHash", () => hashPassword(crypto.randomUUID()));

/** Whether the password is the one; without a hash to compare with, takes as long and says no. */
export async function isPassword(password: string, passwordHash: string | undefined): Promise<boolean> {
  const stored = passwordHash ?? (await nobody());
  const fits = await inLine(() => verify(stored, password));
  return fits && passwordHash !== undefined;
}

/** Why a password may not be chosen, in words for its field; null where it may. */
export function passwordFault(password: string, person: { email: string; name?: string }): string | null {
  const lower = password.toLowerCase();
  if (password.length < LEAST_LENGTH) return `Use at least ${LEAST_LENGTH} characters. A few unrelated words are easy to remember.`;
  if (password.length > MOST_LENGTH) return `Use at most ${MOST_LENGTH} characters.`;
  if (COMMON.has(lower)) return "This password is among the commonest. Choose another.";
  if (lower === person.email.toLowerCase() || lower === person.name?.toLowerCase()) return "Do not use your name or e-mail address as the password.";
  return null;
}
