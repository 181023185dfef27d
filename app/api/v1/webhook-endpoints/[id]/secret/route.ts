import { rotateWebhookSecret as definition } from "@/api-spec/records/webhookEndpoints";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { rotateSecret } from "@/lib/webhooks/endpoints";

export const POST = recordOperation(definition, async (call) => ({ body: await rotateSecret(call, call.params.id) }));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
