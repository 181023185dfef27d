import { z } from "zod";
import { traverseId } from "@/api-spec/records/common";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalRecordOperation } from "@/lib/http/portalRecordOperation";
import { voidTraverse as definition } from "@/api-spec/records/traverses";
import { voidTraverse } from "@/lib/records/traverses/issue";

const params = z.strictObject({ id: traverseId });

export const POST = portalRecordOperation({ access: "developer", params, body: definition.body! }, async (call) => ({ id: (await voidTraverse(call, call.params.id, call.input.reason, () => {})).id }));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
