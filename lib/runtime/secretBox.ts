import { createCipheriv, createDecipheriv, hkdfSync, randomBytes } from "node:crypto";
import { config } from "./config";
import { processWide } from "./processWide";

const CIPHER = "aes-256-gcm";
const IV_BYTES = 12;
const TAG_BYTES = 16;

/** A key for one purpose, derived from the installation's secret (HKDF, RFC 5869). */
export const derivedKey = (purpose: string): Buffer =>
  processWide(`derivedKey.${purpose}`, () => Buffer.from(hkdfSync("sha256", config().AVERDUCT_SECRET, "averduct", purpose, 32)));

/** Encrypts a text that has to be read again, such as a signing key, for the database. */
export function seal(text: string): string {
  const iv = randomBytes(IV_BYTES);
  const cipher = createCipheriv(CIPHER, derivedKey("secret box"), iv);
  const sealed = Buffer.concat([cipher.update(text, "utf8"), cipher.final()]);
  return Buffer.concat([iv, cipher.getAuthTag(), sealed]).toString("base64url");
}

/** The text again. Throws where it was changed, or sealed under another secret. */
export function open(sealed: string): string {
  const bytes = Buffer.from(sealed, "base64url");
  const decipher = createDecipheriv(CIPHER, derivedKey("secret box"), bytes.subarray(0, IV_BYTES), { authTagLength: TAG_BYTES });
  decipher.setAuthTag(bytes.subarray(IV_BYTES, IV_BYTES + TAG_BYTES));
  return Buffer.concat([decipher.update(bytes.subarray(IV_BYTES + TAG_BYTES)), decipher.final()]).toString("utf8");
}
