import { z } from "zod";
import { instrumentId } from "@/api-spec/records/common";
import { calibrationFields } from "@/api-spec/records/instruments";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalRecordOperation } from "@/lib/http/portalRecordOperation";
import { addCalibration, calibrationOf } from "@/lib/records/calibrations";

const params = z.strictObject({ id: instrumentId });

export const POST = portalRecordOperation({ access: "developer", body: calibrationFields, params, status: 201 }, async (call) => calibrationOf(await addCalibration(call, call.params.id, call.input)));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
