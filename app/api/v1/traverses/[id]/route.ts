import { changeTraverse as change, deleteTraverse as deletion, readTraverse as reading } from "@/api-spec/records/traverses";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { traverseOf } from "@/lib/records/traverses/answer";
import { changeTraverse, deleteTraverse } from "@/lib/records/traverses/drafts";
import { findTraverse } from "@/lib/records/traverses/row";

export const GET = recordOperation(reading, async (call) => {
  const row = await findTraverse(call, call.params.id);
  return { body: traverseOf(row, { working: call.query.include === "working" }), version: row.version };
});
export const PATCH = recordOperation(change, async (call) => {
  const row = await changeTraverse(call, call.params.id, call.input, call.requireMatch);
  return { body: traverseOf(row), version: row.version };
});
export const DELETE = recordOperation(deletion, async (call) => {
  await deleteTraverse(call, call.params.id, call.requireMatch);
  return { body: null };
});
export const { POST, PUT } = otherMethods("GET", "PATCH", "DELETE");
