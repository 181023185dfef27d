import { z } from "zod";
import { instrumentId } from "@/api-spec/records/common";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalRecordOperation } from "@/lib/http/portalRecordOperation";
import { deleteInstrument } from "@/lib/records/instruments";

const params = z.strictObject({ id: instrumentId });

export const POST = portalRecordOperation({ access: "developer", params, status: 204 }, (call) => deleteInstrument(call, call.params.id, () => {}));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
