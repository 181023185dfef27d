import { z } from "zod";
import { traverseId } from "@/api-spec/records/common";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalRecordOperation } from "@/lib/http/portalRecordOperation";
import { issueTraverse } from "@/lib/records/traverses/issue";

const params = z.strictObject({ id: traverseId });

export const POST = portalRecordOperation({ access: "developer", params }, async (call) => ({ id: (await issueTraverse(call, call.params.id, () => {})).id }));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
