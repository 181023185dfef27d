import type { RecordContext } from "../context";
import { addHistory } from "../history";
import { findDraft } from "../traverses/row";
import { deleteObjectsAfterCommit } from "./objects";
import { attachmentsOf, findAttachment, type AttachmentRow } from "./row";

/** Changes the caption of a draft's attachment, where one is sent. */
export async function changeAttachment(context: RecordContext, traverseId: string, id: string, { caption }: { caption?: string | null }): Promise<AttachmentRow> {
  await findDraft(context, traverseId);
  const row = await findAttachment(context, traverseId, id);
  if (caption === undefined || caption === row.caption) return row;
  await attachmentsOf(context, traverseId).where("attachments.id", id).update({ caption } as never);
  await addHistory(context, traverseId, "attachment_changed", { attachmentId: id, from: row.caption, to: caption });
  return { ...row, caption };
}

/** Deletes an attachment of a draft, and its bytes once that is committed. */
export async function deleteAttachment(context: RecordContext, traverseId: string, id: string): Promise<void> {
  await findDraft(context, traverseId);
  const row = await findAttachment(context, traverseId, id);
  await attachmentsOf(context, traverseId).where("attachments.id", id).delete();
  await addHistory(context, traverseId, "attachment_deleted", { attachmentId: id, fileName: row.file_name, sha256: row.sha256.toString("hex") });
  deleteObjectsAfterCommit(context.db, [row.storage_key]);
}

/** Deletes the rows of a traverse's attachments, when the draft itself is deleted; returns the keys of their bytes, to be deleted after the commit. */
export async function deleteAttachmentsOf(db: RecordContext["db"], realm: RecordContext["realm"], traverseId: string): Promise<string[]> {
  const rows = await attachmentsOf({ db, realm }, traverseId).select("attachments.storage_key");
  await attachmentsOf({ db, realm }, traverseId).delete();
  return rows.map(({ storage_key }) => storage_key);
}
