import { listDeliveries as definition } from "@/api-spec/records/webhookEndpoints";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { listDeliveries } from "@/lib/webhooks/deliveries";

export const GET = recordOperation(definition, async (call) => ({ body: await listDeliveries(call, call.params.id, call.query) }));
export const { POST, PUT, PATCH, DELETE } = otherMethods("GET");
