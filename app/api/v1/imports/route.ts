import { createImport, listImports as list } from "@/api-spec/records/imports";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { checkImport, type CheckedImport } from "@/lib/records/imports/checkImport";
import { commitImport } from "@/lib/records/imports/commitImport";
import { listImports } from "@/lib/records/imports/listImports";

export const GET = recordOperation(list, async (call) => ({ body: await listImports(call, call.query) }));
export const POST = recordOperation(
  createImport,
  async (call, checked: CheckedImport) => ({ body: call.query.mode === "commit" ? await commitImport(call, checked) : checked.report }),
  (call) => checkImport(call, call.input, call.query),
);
export const { PUT, PATCH, DELETE } = otherMethods("GET", "POST");
