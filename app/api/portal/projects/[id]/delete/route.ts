import { z } from "zod";
import { projectId } from "@/api-spec/records/common";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalRecordOperation } from "@/lib/http/portalRecordOperation";
import { deleteProject } from "@/lib/records/projects";

const params = z.strictObject({ id: projectId });

export const POST = portalRecordOperation({ access: "developer", params, status: 204 }, (call) => deleteProject(call, call.params.id, () => {}));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
