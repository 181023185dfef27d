import { instrumentFields } from "@/api-spec/records/instruments";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalRecordOperation } from "@/lib/http/portalRecordOperation";
import { createInstrument, instrumentOf } from "@/lib/records/instruments";

export const POST = portalRecordOperation({ access: "developer", body: instrumentFields, status: 201 }, async (call) => instrumentOf(await createInstrument(call, call.input)));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
