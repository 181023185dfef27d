import { changeWebhookEndpoint as change, deleteWebhookEndpoint as deletion, readWebhookEndpoint as reading } from "@/api-spec/records/webhookEndpoints";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { changeEndpoint, deleteEndpoint, endpointOf, findEndpoint, type EndpointRow } from "@/lib/webhooks/endpoints";

const answer = (row: EndpointRow) => ({ body: endpointOf(row), version: row.version });

export const GET = recordOperation(reading, async (call) => answer(await findEndpoint(call, call.params.id)));
export const PATCH = recordOperation(change, async (call) => answer(await changeEndpoint(call, call.params.id, call.input, call.requireMatch)));
export const DELETE = recordOperation(deletion, async (call) => {
  await deleteEndpoint(call, call.params.id, call.requireMatch);
  return { body: null };
});
export const { POST, PUT } = otherMethods("GET", "PATCH", "DELETE");
