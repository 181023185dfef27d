import { createAttachment as creation, listAttachments as list } from "@/api-spec/records/attachments";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { listAttachments } from "@/lib/records/attachments/row";
import { answering } from "../../../attachments/answering";
import { upload } from "./upload";

export const GET = recordOperation(list, async (call) => ({ body: { items: await listAttachments(call, call.params.id) } }));
export const POST = answering(creation, (request, params, { key }) => upload(request, params, key!));
export const { PUT, PATCH, DELETE } = otherMethods("GET", "POST");
