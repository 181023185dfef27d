import { hash, verify } from "@node-rs/argon2";
import { Problem } from "@/lib/problems/problem";
import { processWide } from "@/lib/runtime/processWide";
import { inHashingLine } from "./hashingLine";

/** argon2id, the package's default algorithm, with the parameters that OWASP recommends at least. */
const PARAMETERS = { memoryCost: 19 * 1024, timeCost: 2, parallelism: 1 };

export const PASSWORD_NOT_ACCEPTED = "password_not_accepted";

const LEAST_LENGTH = 10;
const MOST_LENGTH = 200;
/** The commonest of the passwords that are long enough. */
const COMMON = new Set(["1234567890", "12345678910", "123456789a", "qwertyuiop", "password12", "password123", "passwordpassword", "1q2w3e4r5t", "q1w2e3r4t5", "iloveyou123", "administrator", "letmein123", "0123456789", "9876543210", "aaaaaaaaaa", "1111111111", "0000000000", "abcdefghij", "qwerty12345", "welcome123"]);

/** One form for what looks the same: keyboards compose accented letters in different ways. */
const asTyped = (password: string): string => password.normalize("NFKC");

export const hashPassword = (password: string): Promise<string> => inHashingLine(() => hash(asTyped(password), PARAMETERS));

/** A hash that no password fits, so that an unknown e-mail costs the same time as a wrong password. */
const nobody = (): Promise<string> => processWide("nobodyHash", () => hash(crypto.randomUUID(), PARAMETERS));

/** Whether the password is the one; without a hash to compare with, takes as long and says no. */
export async function isPassword(password: string, passwordHash: string | undefined): Promise<boolean> {
  const stored = passwordHash ?? (await nobody());
  const fits = await inHashingLine(() => verify(stored, asTyped(password)));
  return fits && passwordHash !== undefined;
}

/** Why nobody may choose a password, in words for its field; null where it may be chosen. */
export function passwordFault(password: string): string | null {
  if (password.length < LEAST_LENGTH) return `Use at least ${LEAST_LENGTH} characters. A few unrelated words are easy to remember.`;
  if (password.length > MOST_LENGTH) return `Use at most ${MOST_LENGTH} characters.`;
  if (COMMON.has(password.toLowerCase())) return "This password is among the commonest. Choose another.";
  return null;
}

/** Throws, with the field at fault, where a password is the person's own name or e-mail address. */
export function requireUnlike({ email, name }: { email: string; name: string }, password: string, pointer = "/password"): void {
  if (![email, name].some((known) => known.toLowerCase() === password.toLowerCase())) return;
  const detail = "Do not use your name or e-mail address as the password.";
  throw new Problem("invalid-request", { detail, errors: [{ pointer, code: PASSWORD_NOT_ACCEPTED, detail }] });
}
