import { createProject as creation, listProjects as list } from "@/api-spec/records/projects";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { createProject, listProjects, projectOf } from "@/lib/records/projects";

export const GET = recordOperation(list, async (call) => ({ body: await listProjects(call, call.query) }));
export const POST = recordOperation(creation, async (call) => {
  const row = await createProject(call, call.input);
  return { body: projectOf(row), version: row.version, location: `/projects/${row.id}` };
});
export const { PUT, PATCH, DELETE } = otherMethods("GET", "POST");
