import { database } from "@/db/connection";
import { canonicalJson } from "@/lib/signing/canonicalJson";
import { verifyDetached } from "@/lib/signing/detachedJws";
import type { IssuedDocument } from "./issuedDocument";
import { rowPart } from "./traverses/document";
import type { TraverseRow } from "./traverses/row";

/** Whether a record is as it was issued: the signature over its document, and its row against the document. */
export type RecordState =
  | { valid: true }
  | { valid: false; reason: "not_a_jws" | "unknown_key" | "signature_does_not_match" | "record_differs_from_document" };

export interface VerifiedRecord {
  /** Null where it was altered so that it cannot even be read. */
  document: IssuedDocument | null;
  jws: string;
  keyId: string;
  state: RecordState;
  status: TraverseRow["status"];
  supersededBy: string | null;
  voided: { at: string; reason: string } | null;
}

interface SignedRow {
  traverse_id: string;
  document: string;
  signature: string;
  signing_key_id: string;
}

const signedRow = (id: string) => database()<SignedRow>("issued_documents").where("traverse_id", id).first();

/** What was signed of a record, and its signature, as anyone may have them. Null where it was not issued. */
export async function signedDocument(id: string): Promise<{ jws: string; document: string; keyId: string } | null> {
  const row = await signedRow(id);
  return row ? { jws: row.signature, document: row.document, keyId: row.signing_key_id } : null;
}

/** A record as anyone may see it, by its id alone: it has to have been issued. Null where it was not. */
export async function verifyRecord(id: string): Promise<VerifiedRecord | null> {
  const signed = await signedRow(id);
  const row = signed && (await database()<TraverseRow>("traverses").where({ id }).first());
  if (!signed || !row) return null;
  const document = parsed(signed.document);
  return {
    document,
    jws: signed.signature,
    keyId: signed.signing_key_id,
    state: await stateOf(signed.signature, signed.document, document, row),
    status: row.status,
    supersededBy: row.superseded_by_id,
    voided: row.voided_at && { at: row.voided_at.toISOString(), reason: row.void_reason ?? "" },
  };
}

async function stateOf(jws: string, text: string, document: IssuedDocument | null, row: TraverseRow): Promise<RecordState> {
  const signature = await verifyDetached(jws, text);
  if (!signature.valid) return signature;
  return document && agrees(document, row) ? { valid: true } : { valid: false, reason: "record_differs_from_document" };
}

function agrees(document: IssuedDocument, row: TraverseRow): boolean {
  try {
    const part = rowPart(row);
    const signed = Object.fromEntries(Object.keys(part).map((name) => [name, document[name as keyof typeof part]]));
    return canonicalJson(part) === canonicalJson(signed);
  } catch {
    // A row from which no document can be made any more differs from the one that was signed.
    return false;
  }
}

function parsed(text: string): IssuedDocument | null {
  try {
    return JSON.parse(text) as IssuedDocument;
  } catch {
    return null;
  }
}
