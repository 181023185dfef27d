import { z } from "zod";
import { traverseId } from "@/api-spec/records/common";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalRecordOperation } from "@/lib/http/portalRecordOperation";
import { deleteTraverse } from "@/lib/records/traverses/drafts";

const params = z.strictObject({ id: traverseId });

export const POST = portalRecordOperation({ access: "developer", params, status: 204 }, (call) => deleteTraverse(call, call.params.id, () => {}));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
