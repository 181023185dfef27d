import { readCalibration as reading } from "@/api-spec/records/instruments";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { calibrationOf, findCalibration } from "@/lib/records/calibrations";

export const GET = recordOperation(reading, async (call) => ({ body: calibrationOf(await findCalibration(call, call.params.id, call.params.calibrationId)) }));
export const { POST, PUT, PATCH, DELETE } = otherMethods("GET");
