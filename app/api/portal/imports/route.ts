import type { z } from "zod";
import { createImport, importOptions } from "@/api-spec/records/imports";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalRecordOperation } from "@/lib/http/portalRecordOperation";
import { checkImport, type CheckedImport } from "@/lib/records/imports/checkImport";
import { commitImport } from "@/lib/records/imports/commitImport";

const { body, bodyMedia, maxBodyBytes } = createImport;

export const POST = portalRecordOperation(
  { access: "developer", body: body as z.ZodType<string>, bodyMedia, maxBodyBytes, query: importOptions },
  async (call, checked: CheckedImport) => (call.query.mode === "commit" ? commitImport(call, checked) : checked.report),
  (call) => checkImport(call, call.input, call.query),
);
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
