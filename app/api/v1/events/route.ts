import { listEvents as definition } from "@/api-spec/records/events";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { listEvents } from "@/lib/webhooks/events";

export const GET = recordOperation(definition, async (call) => ({ body: await listEvents(call, call.query) }));
export const { POST, PUT, PATCH, DELETE } = otherMethods("GET");
