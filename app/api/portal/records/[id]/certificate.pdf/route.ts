import { z } from "zod";
import { traverseId } from "@/api-spec/records/common";
import { otherMethods } from "@/lib/http/otherMethods";
import { pdf } from "@/lib/http/pdf";
import { portalFile } from "@/lib/http/portalRecordOperation";
import { certificateOf } from "@/lib/records/certificate";
import { findTraverse } from "@/lib/records/traverses/row";

export const GET = portalFile(z.strictObject({ id: traverseId }), async (reading, { id }) => {
  await findTraverse(reading, id);
  return pdf(await certificateOf(id), id);
});
export const { POST, PUT, PATCH, DELETE } = otherMethods("GET");
