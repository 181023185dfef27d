import { redeliver as definition } from "@/api-spec/records/webhookEndpoints";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { redeliver } from "@/lib/webhooks/deliveries";

export const POST = recordOperation(definition, async (call) => ({ body: await redeliver(call, call.params.id, call.params.deliveryId) }));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
