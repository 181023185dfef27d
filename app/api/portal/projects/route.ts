import { projectFields } from "@/api-spec/records/projects";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalRecordOperation } from "@/lib/http/portalRecordOperation";
import { createProject, projectOf } from "@/lib/records/projects";

export const POST = portalRecordOperation({ access: "developer", body: projectFields, status: 201 }, async (call) => projectOf(await createProject(call, call.input)));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
