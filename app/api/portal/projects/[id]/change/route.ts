import { z } from "zod";
import { projectId } from "@/api-spec/records/common";
import { projectChange } from "@/api-spec/records/projects";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalRecordOperation } from "@/lib/http/portalRecordOperation";
import { changeProject, projectOf } from "@/lib/records/projects";

const params = z.strictObject({ id: projectId });

export const POST = portalRecordOperation({ access: "developer", body: projectChange, params }, async (call) => projectOf(await changeProject(call, call.params.id, call.input, () => {})));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
