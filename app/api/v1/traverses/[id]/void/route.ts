import { voidTraverse as withdrawal } from "@/api-spec/records/traverses";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { traverseOf } from "@/lib/records/traverses/answer";
import { voidTraverse } from "@/lib/records/traverses/issue";

export const POST = recordOperation(withdrawal, async (call) => {
  const row = await voidTraverse(call, call.params.id, call.input.reason, call.requireMatch);
  return { body: traverseOf(row), version: row.version };
});
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
