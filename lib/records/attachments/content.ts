import type { ReadableStream } from "node:stream/web";
import { database } from "@/db/connection";
import { NoSuchObject, objectStore } from "@/lib/storage/objectStore";
import { log } from "@/lib/runtime/log";
import { noSuchRecord } from "../noSuchRecord";
import { requireLink } from "./link";
import type { AttachmentRow } from "./row";

/** An attachment's content by its link, which is all that its holder needs: whose record it is was asked when the link was made. */
export async function contentByLink(id: string, link: { expires: number; signature: string }): Promise<{ row: AttachmentRow; body: ReadableStream<Uint8Array> }> {
  requireLink(id, link);
  const row = await database()<AttachmentRow>("attachments").where({ id }).first();
  if (!row) throw noSuchRecord("attachment");
  try {
    return { row, body: (await objectStore().get(row.storage_key)).body };
  } catch (error) {
    if (!(error instanceof NoSuchObject)) throw error;
    // Deleted between the two, or lost.
    log().error({ attachment: id }, "an attachment's bytes are not there");
    throw noSuchRecord("attachment");
  }
}
