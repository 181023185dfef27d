import { attachmentFormFields, createAttachment as definition } from "@/api-spec/records/attachments";
import { database } from "@/db/connection";
import { claimIdempotencyKey, fingerprintOf, idempotencyKeyOf, keepAnswer, type KeptAnswer } from "@/lib/http/idempotency";
import { inTransaction } from "@/lib/http/recordOperation";
import { validate } from "@/lib/http/validation";
import type { Key } from "@/lib/keys/keyDirectory";
import { addAttachment, storeFile, type StoredFile } from "@/lib/records/attachments/add";
import { deleteObjects } from "@/lib/records/attachments/objects";
import { readForm } from "@/lib/records/attachments/readForm";
import { attachmentOf } from "@/lib/records/attachments/row";
import { findTraverse } from "@/lib/records/traverses/row";

/**
 * Takes a file for a draft. The body is read and its bytes are stored before the transaction begins, so that nobody's
 * slow connection holds a lock; bytes that come to no row are deleted again.
 */
export async function upload(request: Request, params: Record<string, string>, { id: apiKeyId, organisationId, environment }: Key): Promise<Response> {
  const { id } = validate(definition.params!, params, "path");
  const realm = { organisationId, environment };
  await findTraverse({ db: database(), realm }, id);
  const repeatable = idempotencyKeyOf(request);
  const { file, fileName, fields } = await readForm(request);
  const { caption = null } = validate(attachmentFormFields, withoutEmpty(fields));
  const stored = await storeFile(realm, { file, fileName, caption });
  const answer = await orDiscard(stored, () =>
    inTransaction(async (db) => {
      const before = repeatable && (await claimIdempotencyKey(db, realm, repeatable, fingerprintOf("POST", `/traverses/${id}/attachments`, fingerprinted(stored))));
      if (before) return { ...before, repeated: true };
      const row = await addAttachment({ db, realm, by: { apiKeyId } }, id, stored);
      const made = created(id, row.id, JSON.stringify(attachmentOf(row)));
      if (repeatable) await keepAnswer(db, realm, repeatable, made);
      return { ...made, repeated: false };
    }),
  );
  if (answer.repeated) deleteObjects([stored.key]);
  return new Response(answer.text, { status: answer.status, headers: answer.headers });
}

/** A form sends a field that was left empty, too. */
const withoutEmpty = (fields: Record<string, string>): Record<string, string> => Object.fromEntries(Object.entries(fields).filter(([, value]) => value.trim() !== ""));

/** What makes two uploads the same; the boundary of the form does not. */
const fingerprinted = ({ sha256, fileName, caption }: StoredFile): unknown => [sha256.toString("hex"), fileName, caption];

async function orDiscard<Result>(stored: StoredFile, work: () => Promise<Result>): Promise<Result> {
  try {
    return await work();
  } catch (error) {
    deleteObjects([stored.key]);
    throw error;
  }
}

const created = (traverseId: string, id: string, text: string): KeptAnswer => ({
  status: 201,
  headers: { "Content-Type": "application/json", "Cache-Control": "private, no-cache", Location: `/api/v1/traverses/${traverseId}/attachments/${id}` },
  text,
});
