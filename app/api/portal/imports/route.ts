import { createImport, importOptions } from "@/api-spec/records/imports";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalRecordOperation } from "@/lib/http/portalRecordOperation";
import { checkImport } from "@/lib/records/imports/checkImport";
import { commitImport } from "@/lib/records/imports/commitImport";

const { body, bodyMedia, maxBodyBytes } = createImport;

export const POST = portalRecordOperation({ access: "developer", body: body!, bodyMedia, maxBodyBytes, query: importOptions }, async (call) => {
  const checked = await checkImport(call, call.input, call.query);
  return call.query.mode === "commit" ? commitImport(call, checked) : checked.report;
});
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
