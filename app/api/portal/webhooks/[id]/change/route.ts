import { z } from "zod";
import { webhookEndpointChange, webhookEndpointId } from "@/api-spec/records/webhookEndpoints";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalRecordOperation } from "@/lib/http/portalRecordOperation";
import { changeEndpoint, endpointOf } from "@/lib/webhooks/endpoints";

const params = z.strictObject({ id: webhookEndpointId });

export const POST = portalRecordOperation({ access: "developer", body: webhookEndpointChange, params }, async (call) =>
  endpointOf(await changeEndpoint(call, call.params.id, call.input, () => {})),
);
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
