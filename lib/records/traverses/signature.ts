import { config } from "@/lib/runtime/config";
import { refusal } from "@/lib/problems/problem";
import type { RecordContext } from "../context";
import { findTraverse } from "./row";

/** What was signed of a traverse, and its signature. Throws the problem where it was never issued. */
export async function signatureOf({ db, realm }: Pick<RecordContext, "db" | "realm">, id: string) {
  await findTraverse({ db, realm }, id);
  const row = await db<{ document: string; signature: string; signing_key_id: string; traverse_id: string }>("issued_documents").where("traverse_id", id).first();
  if (!row) {
    throw refusal("not-issued", "The traverse is a draft; only what was issued is signed.");
  }
  const base = config().AVERDUCT_URL;
  return { jws: row.signature, document: row.document, keyId: row.signing_key_id, jwks: `${base}/.well-known/jwks.json`, verify: verifyUrl(id) };
}

/** The address of the page where anyone can check a record. */
export const verifyUrl = (id: string): string => `${config().AVERDUCT_URL}/verify/${id}`;
