import { readHistory as reading } from "@/api-spec/records/traverses";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { historyOf } from "@/lib/records/history";
import { findTraverse } from "@/lib/records/traverses/row";

export const GET = recordOperation(reading, async (call) => {
  const { id } = await findTraverse(call, call.params.id);
  return { body: { items: await historyOf(call, id) } };
});
export const { POST, PUT, PATCH, DELETE } = otherMethods("GET");
