import { readImport as definition } from "@/api-spec/records/imports";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { readImport } from "@/lib/records/imports/listImports";

export const GET = recordOperation(definition, async (call) => ({ body: await readImport(call, call.params.id) }));
export const { POST, PUT, PATCH, DELETE } = otherMethods("GET");
