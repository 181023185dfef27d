import { createHash } from "node:crypto";
import { MOST_ATTACHMENTS, type AttachmentMediaType } from "@/api-spec/records/attachments";
import { newId } from "@/lib/ids/newId";
import { refusal } from "@/lib/problems/problem";
import { objectStore } from "@/lib/storage/objectStore";
import type { RecordContext } from "../context";
import { addHistory } from "../history";
import { addRecord, type Realm } from "../realm";
import { findDraft } from "../traverses/row";
import { mediaTypeOf } from "./formats/mediaType";
import { displayName } from "./fileName";
import { storageKey } from "./objects";
import { attachmentsOf, findAttachment, type AttachmentRow } from "./row";

/** An attachment whose bytes are stored, and whose row is not there yet. */
export interface StoredFile {
  id: string;
  key: string;
  fileName: string;
  caption: string | null;
  mediaType: AttachmentMediaType;
  bytes: number;
  sha256: Buffer;
}

export interface NewFile {
  file: Buffer;
  fileName: string;
  caption: string | null;
}

/** Looks at a file and stores its bytes. Before its row: a row without its bytes would be a loss, bytes without a row are swept up. */
export async function storeFile(realm: Realm, { file, fileName, caption }: NewFile): Promise<StoredFile> {
  const mediaType = mediaTypeOf(file);
  const id = newId("att");
  const key = storageKey(realm, id);
  await objectStore().put(key, file, mediaType);
  return { id, key, fileName: displayName(fileName, mediaType), caption, mediaType, bytes: file.length, sha256: createHash("sha256").update(file).digest() };
}

/** Adds the row of a stored file to a draft. */
export async function addAttachment(context: RecordContext, traverseId: string, { id, key, fileName, caption, mediaType, bytes, sha256 }: StoredFile): Promise<AttachmentRow> {
  await findDraft(context, traverseId);
  await requireRoom(context, traverseId);
  await addRecord(context.db, "attachments", context.realm, {
    id, traverse_id: traverseId, file_name: fileName, caption, media_type: mediaType, bytes, sha256, storage_key: key, created_at: new Date(),
  });
  await addHistory(context, traverseId, "attachment_added", { attachmentId: id, fileName, sha256: sha256.toString("hex") });
  return findAttachment(context, traverseId, id);
}

/** Counts with the draft's row locked, so that two uploads at once are counted one after the other. */
async function requireRoom(context: RecordContext, traverseId: string): Promise<void> {
  const held = await attachmentsOf(context, traverseId).select("attachments.id");
  if (held.length < MOST_ATTACHMENTS) return;
  throw refusal("invalid-request", `The traverse has ${held.length} attachments, as many as it can have.`, { code: "too_many_attachments" });
}
