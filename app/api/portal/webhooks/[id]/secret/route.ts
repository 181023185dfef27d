import { z } from "zod";
import { webhookEndpointId } from "@/api-spec/records/webhookEndpoints";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalRecordOperation } from "@/lib/http/portalRecordOperation";
import { rotateSecret } from "@/lib/webhooks/endpoints";

const params = z.strictObject({ id: webhookEndpointId });

export const POST = portalRecordOperation({ access: "developer", params }, (call) => rotateSecret(call, call.params.id));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
