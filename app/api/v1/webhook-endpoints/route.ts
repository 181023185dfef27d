import { createWebhookEndpoint as creation, listWebhookEndpoints as list } from "@/api-spec/records/webhookEndpoints";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { createEndpoint, endpointOf, listEndpoints } from "@/lib/webhooks/endpoints";

export const GET = recordOperation(list, async (call) => ({ body: await listEndpoints(call, call.query) }));
export const POST = recordOperation(creation, async (call) => {
  const { row, secret } = await createEndpoint(call, call.input);
  return { body: { ...endpointOf(row), secret }, version: row.version, location: `/webhook-endpoints/${row.id}` };
});
export const { PUT, PATCH, DELETE } = otherMethods("GET", "POST");
