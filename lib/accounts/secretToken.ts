import { createHash, randomBytes } from "node:crypto";

/** A secret that its bearer shows again: only its hash is stored. */
export function makeSecretToken(): { token: string; hash: Buffer } {
  const token = randomBytes(32).toString("base64url");
  return { token, hash: hashToken(token) };
}

export const hashToken = (token: string): Buffer => createHash("sha256").update(token).digest();
