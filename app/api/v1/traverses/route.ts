import { createTraverse as creation, listTraverses as list } from "@/api-spec/records/traverses";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { traverseOf } from "@/lib/records/traverses/answer";
import { createTraverse } from "@/lib/records/traverses/drafts";
import { listTraverses } from "@/lib/records/traverses/list";

export const GET = recordOperation(list, async (call) => ({ body: await listTraverses(call, call.query) }));
export const POST = recordOperation(creation, async (call) => {
  const row = await createTraverse(call, call.input);
  return { body: traverseOf(row), version: row.version, location: `/traverses/${row.id}` };
});
export const { PUT, PATCH, DELETE } = otherMethods("GET", "POST");
