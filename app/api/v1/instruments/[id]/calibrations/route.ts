import { createCalibration as creation, listCalibrations as list } from "@/api-spec/records/instruments";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { addCalibration, calibrationOf, listCalibrations } from "@/lib/records/calibrations";

export const GET = recordOperation(list, async (call) => ({ body: await listCalibrations(call, call.params.id, call.query) }));
export const POST = recordOperation(creation, async (call) => {
  const row = await addCalibration(call, call.params.id, call.input);
  return { body: calibrationOf(row), location: `/instruments/${row.instrument_id}/calibrations/${row.id}` };
});
export const { PUT, PATCH, DELETE } = otherMethods("GET", "POST");
