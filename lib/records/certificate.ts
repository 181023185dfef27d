import { certificate } from "@/lib/certificate/certificate";
import { refusal } from "@/lib/problems/problem";
import { verifyUrl } from "./traverses/signature";
import { verifyRecord } from "./verifyRecord";

/**
 * The certificate of an issued record. Throws the problem where it was never issued, or is not any more what was signed:
 * nobody gets a certificate of a record that was altered.
 */
export async function certificateOf(id: string): Promise<Buffer> {
  const record = await verifyRecord(id);
  if (!record) throw refusal("not-issued", "Only what was issued has a certificate.");
  const { document, state, status, supersededBy, voided, keyId } = record;
  if (!document || !state.valid || status === "draft") throw refusal("record-altered", "The stored record is not what was signed, so it gets no certificate.");
  return certificate(document, { verifyUrl: verifyUrl(id), status, supersededBy, voidReason: voided?.reason ?? null, signingKeyId: keyId });
}
