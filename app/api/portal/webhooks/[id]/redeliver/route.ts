import { z } from "zod";
import { deliveryId, webhookEndpointId } from "@/api-spec/records/webhookEndpoints";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalRecordOperation } from "@/lib/http/portalRecordOperation";
import { redeliver } from "@/lib/webhooks/deliveries";

const params = z.strictObject({ id: webhookEndpointId });
const body = z.strictObject({ deliveryId });

export const POST = portalRecordOperation({ access: "developer", body, params }, (call) => redeliver(call, call.params.id, call.input.deliveryId));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
