import { verifyDetached } from "@/lib/signing/detachedJws";
import { verifyUrl } from "./traverses/signature";
import { verifyRecord } from "./verifyRecord";

/** Whether a signature holds for a document, and what has become of the record since. */
export async function verifySignature({ jws, document }: { jws: string; document?: string | undefined }) {
  const [detached, text] = document === undefined ? split(jws) : [jws, document];
  const state = await verifyDetached(detached, text);
  if (!state.valid) return { valid: false, reason: state.reason, keyId: null, record: null };
  return { valid: true, reason: null, keyId: state.keyId, record: await recordOfDocument(text) };
}

/** A compact JWS as a detached one and its payload. */
function split(jws: string): [string, string] {
  const [header = "", payload = "", signature = ""] = jws.split(".");
  return [`${header}..${signature}`, Buffer.from(payload, "base64url").toString("utf8")];
}

async function recordOfDocument(text: string) {
  const { id, revision } = JSON.parse(text) as { id: string; revision: number };
  const record = await verifyRecord(id);
  return record && { id, revision, status: record.status, supersededBy: record.supersededBy, voided: record.voided, page: verifyUrl(id) };
}
