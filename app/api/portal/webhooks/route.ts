import { webhookEndpointFields } from "@/api-spec/records/webhookEndpoints";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalRecordOperation } from "@/lib/http/portalRecordOperation";
import { createEndpoint } from "@/lib/webhooks/endpoints";

export const POST = portalRecordOperation({ access: "developer", body: webhookEndpointFields, status: 201 }, async (call) => {
  const { row, secret } = await createEndpoint(call, call.input);
  return { id: row.id, secret };
});
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
