import { z } from "zod";
import { traverseId } from "@/api-spec/records/common";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalRecordOperation } from "@/lib/http/portalRecordOperation";
import { reviseTraverse } from "@/lib/records/traverses/issue";

const params = z.strictObject({ id: traverseId });

export const POST = portalRecordOperation({ access: "developer", params, status: 201 }, async (call) => ({ id: (await reviseTraverse(call, call.params.id, () => {})).id }));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
