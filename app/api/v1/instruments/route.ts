import { createInstrument as creation, listInstruments as list } from "@/api-spec/records/instruments";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { createInstrument, instrumentOf, listInstruments } from "@/lib/records/instruments";

export const GET = recordOperation(list, async (call) => ({ body: await listInstruments(call, call.query) }));
export const POST = recordOperation(creation, async (call) => {
  const row = await createInstrument(call, call.input);
  return { body: instrumentOf(row), version: row.version, location: `/instruments/${row.id}` };
});
export const { PUT, PATCH, DELETE } = otherMethods("GET", "POST");
