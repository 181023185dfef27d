import { readCertificate as reading } from "@/api-spec/records/traverses";
import { otherMethods } from "@/lib/http/otherMethods";
import { pdf } from "@/lib/http/pdf";
import { recordOperation } from "@/lib/http/recordOperation";
import { certificateOf } from "@/lib/records/certificate";
import { findTraverse } from "@/lib/records/traverses/row";

export const GET = recordOperation(reading, async (call) => {
  const { id } = await findTraverse(call, call.params.id);
  return pdf(await certificateOf(id), id);
});
export const { POST, PUT, PATCH, DELETE } = otherMethods("GET");
