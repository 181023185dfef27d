import { hash, randomInt, timingSafeEqual } from "node:crypto";
import { crc32 } from "node:zlib";
import { newId } from "@/lib/ids/newId";

export type Environment = "sandbox" | "production";

/**
 * `averduct_<environment>_<id>_<secret><checksum>`.
 * The id is the 26 characters of the key's TypeID, the secret 32 and the checksum 6 characters of base 62.
 * The same expression finds keys that leaked into a repository or a log.
 */
export const KEY_PATTERN = /averduct_(sandbox|production)_([0-9a-hjkmnp-tv-z]{26})_([0-9A-Za-z]{32})([0-9A-Za-z]{6})/;
const WHOLE_KEY = new RegExp(`^${KEY_PATTERN.source}$`);

const BASE_62 = "0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz";
const SECRET_LENGTH = 32;
const CHECKSUM_LENGTH = 6;

export interface ParsedKey {
  id: string;
  environment: Environment;
  secretHash: Buffer;
}

/** CRC-32 of everything before it, in base 62: a mistyped key is refused without looking it up. */
function checksum(text: string): string {
  let rest = crc32(text);
  let digits = "";
  for (let place = 0; place < CHECKSUM_LENGTH; place += 1) {
    digits = BASE_62[rest % 62] + digits;
    rest = Math.floor(rest / 62);
  }
  return digits;
}

const hashSecret = (secret: string): Buffer => hash("sha256", secret, "buffer");

/** Makes a key's text. Only the hash may be kept; the text is for the caller's eyes, once. */
export function makeKeyText(environment: Environment): ParsedKey & { text: string } {
  const id = newId("key");
  const secret = Array.from({ length: SECRET_LENGTH }, () => BASE_62[randomInt(62)]).join("");
  const body = `averduct_${environment}_${id.slice("key_".length)}_${secret}`;
  return { id, environment, secretHash: hashSecret(secret), text: body + checksum(body) };
}

/** Takes a key's text apart; null when its form or its checksum is wrong. */
export function parseKeyText(text: string): ParsedKey | null {
  const match = WHOLE_KEY.exec(text);
  if (!match) return null;
  const [, environment, id, secret, sum] = match as unknown as [string, Environment, string, string, string];
  if (checksum(text.slice(0, -CHECKSUM_LENGTH)) !== sum) return null;
  return { id: `key_${id}`, environment, secretHash: hashSecret(secret) };
}

export const sameSecret = (one: Buffer, other: Buffer): boolean => timingSafeEqual(one, other);
