import { reviseTraverse as revision } from "@/api-spec/records/traverses";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { traverseOf } from "@/lib/records/traverses/answer";
import { reviseTraverse } from "@/lib/records/traverses/issue";

export const POST = recordOperation(revision, async (call) => {
  const row = await reviseTraverse(call, call.params.id, call.requireMatch);
  return { body: traverseOf(row), version: row.version, location: `/traverses/${row.id}` };
});
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
