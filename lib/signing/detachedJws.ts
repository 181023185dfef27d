import { CompactSign, compactVerify, decodeProtectedHeader, importJWK } from "jose";
import type { Knex } from "knex";
import { ALGORITHM, currentSigningKey, publicKeys } from "./signingKeys";

/** A detached JWS (RFC 7515, appendix F) over a text, by the key that signs now. */
export async function signDetached(text: string, db?: Knex): Promise<{ jws: string; keyId: string }> {
  const { id, privateJwk } = await currentSigningKey(db);
  const signed = await new CompactSign(new TextEncoder().encode(text)).setProtectedHeader({ alg: ALGORITHM, kid: id }).sign(await importJWK(privateJwk, ALGORITHM));
  const [header, , signature] = signed.split(".");
  return { jws: `${header}..${signature}`, keyId: id };
}

export type SignatureState = { valid: true; keyId: string } | { valid: false; reason: "not_a_jws" | "unknown_key" | "signature_does_not_match" };

/** Whether a detached JWS is one of ours over this text. Only our own keys and our one algorithm are taken, whatever its header says. */
export async function verifyDetached(jws: string, text: string): Promise<SignatureState> {
  const parts = jws.split(".");
  if (parts.length !== 3 || parts[1] !== "") return { valid: false, reason: "not_a_jws" };
  const keyId = keyIdOf(jws);
  if (keyId === null) return { valid: false, reason: "not_a_jws" };
  const key = (await publicKeys()).find(({ id }) => id === keyId);
  if (!key) return { valid: false, reason: "unknown_key" };
  const payload = Buffer.from(text, "utf8").toString("base64url");
  try {
    await compactVerify(`${parts[0]}.${payload}.${parts[2]}`, await importJWK(key.publicJwk, ALGORITHM), { algorithms: [ALGORITHM] });
    return { valid: true, keyId };
  } catch {
    return { valid: false, reason: "signature_does_not_match" };
  }
}

function keyIdOf(jws: string): string | null {
  try {
    const { kid } = decodeProtectedHeader(jws);
    return typeof kid === "string" ? kid : null;
  } catch {
    return null;
  }
}
