// Checks the signature of a record with nothing but the published key set. No packages, no call to the API.
//   npx tsx verify.ts signature.json jwks.json        (either may be an https address)
// signature.json is the answer of GET /api/v1/traverses/{id}/signature: { "jws": …, "document": … }
import { createPublicKey, verify } from "node:crypto";
import { readFile } from "node:fs/promises";

interface Key {
  kid: string;
  kty: string;
  crv: string;
  x: string;
}

const read = async (place: string): Promise<unknown> => (/^https?:/.test(place) ? (await fetch(place)).json() : JSON.parse(await readFile(place, "utf8")));

/** Whether a detached JWS (RFC 7515, appendix F) by one of these keys covers this text. */
export function isSigned(jws: string, text: string, keys: Key[]): boolean {
  const [header = "", payload, signature = ""] = jws.split(".");
  const { alg, kid } = JSON.parse(Buffer.from(header, "base64url").toString()) as { alg?: string; kid?: string };
  const key = keys.find((one) => one.kid === kid && one.kty === "OKP" && one.crv === "Ed25519");
  // The algorithm is ours to choose, not the signature's: a header that asks for another is refused.
  if (payload !== "" || alg !== "EdDSA" || !key) return false;
  const signed = `${header}.${Buffer.from(text, "utf8").toString("base64url")}`;
  return verify(null, Buffer.from(signed), createPublicKey({ key: { kty: key.kty, crv: key.crv, x: key.x }, format: "jwk" }), Buffer.from(signature, "base64url"));
}

const [signaturePlace, keysPlace] = process.argv.slice(2);
if (signaturePlace && keysPlace) {
  const { jws, document } = (await read(signaturePlace)) as { jws: string; document: string };
  const { keys } = (await read(keysPlace)) as { keys: Key[] };
  const holds = isSigned(jws, document, keys);
  console.log(holds ? "The signature holds." : "THE SIGNATURE DOES NOT HOLD: this is not the document that was signed.");
  if (holds) {
    const { id, revision, technician, takenAt, result } = JSON.parse(document) as { id: string; revision: number; technician: string; takenAt: string; result: { airflow: { actual: { value: number; unit: string } } } };
    console.log(`${id}, revision ${revision}, taken ${takenAt} by ${technician}: ${result.airflow.actual.value.toFixed(1)} ${result.airflow.actual.unit}`);
  }
  process.exitCode = holds ? 0 : 1;
}
