import { readSignature as reading } from "@/api-spec/records/traverses";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { signatureOf } from "@/lib/records/traverses/signature";

export const GET = recordOperation(reading, async (call) => ({ body: await signatureOf(call, call.params.id) }));
export const { POST, PUT, PATCH, DELETE } = otherMethods("GET");
