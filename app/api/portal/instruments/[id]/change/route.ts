import { z } from "zod";
import { instrumentId } from "@/api-spec/records/common";
import { instrumentChange } from "@/api-spec/records/instruments";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalRecordOperation } from "@/lib/http/portalRecordOperation";
import { changeInstrument, instrumentOf } from "@/lib/records/instruments";

const params = z.strictObject({ id: instrumentId });

export const POST = portalRecordOperation({ access: "developer", body: instrumentChange, params }, async (call) => instrumentOf(await changeInstrument(call, call.params.id, call.input, () => {})));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
