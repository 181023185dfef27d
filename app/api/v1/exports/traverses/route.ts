import { exportTraverses as definition } from "@/api-spec/records/exports";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { exportTraverses } from "@/lib/records/exports/exportTraverses";

export const GET = recordOperation(definition, (call) => exportTraverses(call, call.query));
export const { POST, PUT, PATCH, DELETE } = otherMethods("GET");
