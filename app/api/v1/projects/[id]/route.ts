import { changeProject as change, deleteProject as deletion, readProject as reading } from "@/api-spec/records/projects";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { changeProject, deleteProject, findProject, projectOf } from "@/lib/records/projects";

export const GET = recordOperation(reading, async (call) => {
  const row = await findProject(call, call.params.id);
  return { body: projectOf(row), version: row.version };
});
export const PATCH = recordOperation(change, async (call) => {
  const row = await changeProject(call, call.params.id, call.input, call.requireMatch);
  return { body: projectOf(row), version: row.version };
});
export const DELETE = recordOperation(deletion, async (call) => {
  await deleteProject(call, call.params.id, call.requireMatch);
  return { body: null };
});
export const { POST, PUT } = otherMethods("GET", "PATCH", "DELETE");
