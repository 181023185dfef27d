import { readEvent as definition } from "@/api-spec/records/events";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { readEvent } from "@/lib/webhooks/events";

export const GET = recordOperation(definition, async (call) => ({ body: await readEvent(call, call.params.id) }));
export const { POST, PUT, PATCH, DELETE } = otherMethods("GET");
