import type { z } from "zod";
import type { attachmentAnswer, AttachmentMediaType } from "@/api-spec/records/attachments";
import type { RecordContext } from "../context";
import { noSuchRecord } from "../noSuchRecord";
import { recordsOf } from "../realm";
import { findTraverse } from "../traverses/row";
import { linkTo } from "./link";

export type Attachment = z.output<typeof attachmentAnswer>;
type Reading = Pick<RecordContext, "db" | "realm">;

export interface AttachmentRow {
  id: string;
  traverse_id: string;
  file_name: string;
  caption: string | null;
  media_type: AttachmentMediaType;
  bytes: number;
  sha256: Buffer;
  storage_key: string;
  created_at: Date;
}

export const attachmentOf = ({ id, traverse_id, file_name, caption, media_type, bytes, sha256, created_at }: AttachmentRow): Attachment => ({
  id, traverseId: traverse_id, fileName: file_name, caption, mediaType: media_type, bytes, sha256: sha256.toString("hex"), createdAt: created_at.toISOString(), ...linkTo(id),
});

export const attachmentsOf = ({ db, realm }: Reading, traverseId: string) => recordsOf<AttachmentRow>(db, "attachments", realm).where("attachments.traverse_id", traverseId);

/** The row of a traverse's attachment. Throws the problem where there is none. */
export async function findAttachment(context: Reading, traverseId: string, id: string): Promise<AttachmentRow> {
  const row = await attachmentsOf(context, traverseId).where("attachments.id", id).first();
  if (!row) throw noSuchRecord("attachment");
  return row;
}

/** All attachments of a traverse, the first first. */
export async function listAttachments(context: Reading, traverseId: string): Promise<Attachment[]> {
  await findTraverse(context, traverseId);
  return (await attachmentsOf(context, traverseId).orderBy("attachments.id")).map(attachmentOf);
}
