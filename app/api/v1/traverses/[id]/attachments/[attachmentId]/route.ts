import { changeAttachment as change, deleteAttachment as deletion, readAttachment as reading } from "@/api-spec/records/attachments";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { changeAttachment, deleteAttachment } from "@/lib/records/attachments/change";
import { attachmentOf, findAttachment } from "@/lib/records/attachments/row";

export const GET = recordOperation(reading, async (call) => ({ body: attachmentOf(await findAttachment(call, call.params.id, call.params.attachmentId)) }));
export const PATCH = recordOperation(change, async (call) => ({ body: attachmentOf(await changeAttachment(call, call.params.id, call.params.attachmentId, call.input)) }));
export const DELETE = recordOperation(deletion, async (call) => {
  await deleteAttachment(call, call.params.id, call.params.attachmentId);
  return { body: null };
});
export const { POST, PUT } = otherMethods("GET", "PATCH", "DELETE");
