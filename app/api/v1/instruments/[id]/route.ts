import { changeInstrument as change, deleteInstrument as deletion, readInstrument as reading } from "@/api-spec/records/instruments";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { changeInstrument, deleteInstrument, findInstrument, instrumentOf } from "@/lib/records/instruments";

export const GET = recordOperation(reading, async (call) => {
  const row = await findInstrument(call, call.params.id);
  return { body: instrumentOf(row), version: row.version };
});
export const PATCH = recordOperation(change, async (call) => {
  const row = await changeInstrument(call, call.params.id, call.input, call.requireMatch);
  return { body: instrumentOf(row), version: row.version };
});
export const DELETE = recordOperation(deletion, async (call) => {
  await deleteInstrument(call, call.params.id, call.requireMatch);
  return { body: null };
});
export const { POST, PUT } = otherMethods("GET", "PATCH", "DELETE");
