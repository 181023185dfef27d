import { issueTraverse as issue } from "@/api-spec/records/traverses";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { traverseOf } from "@/lib/records/traverses/answer";
import { issueTraverse } from "@/lib/records/traverses/issue";

export const POST = recordOperation(issue, async (call) => {
  const row = await issueTraverse(call, call.params.id, call.requireMatch);
  return { body: traverseOf(row), version: row.version };
});
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
