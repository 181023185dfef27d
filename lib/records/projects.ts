import type { z } from "zod";
import type { projectAnswer, projectChange, projectFields, projectsQuery } from "@/api-spec/records/projects";
import { newId } from "@/lib/ids/newId";
import { refusal } from "@/lib/problems/problem";
import type { RecordContext } from "./context";
import { noSuchRecord } from "./noSuchRecord";
import { containing, pageOf, type Page } from "./page";
import { addRecord, recordsOf } from "./realm";

export type Project = z.output<typeof projectAnswer>;
type Reading = Pick<RecordContext, "db" | "realm">;

export interface ProjectRow {
  id: string;
  version: number;
  name: string;
  number: string | null;
  location: string | null;
  notes: string | null;
  created_at: Date;
  updated_at: Date;
}

export const projectOf = ({ id, name, number, location, notes, created_at, updated_at }: ProjectRow): Project => ({
  id, name, number, location, notes, createdAt: created_at.toISOString(), updatedAt: updated_at.toISOString(),
});

export const projects = ({ db, realm }: Reading) => recordsOf<ProjectRow>(db, "projects", realm);

/** The row of a project. Throws the problem where there is none. */
export async function findProject(context: Reading, id: string, lock = false): Promise<ProjectRow> {
  const query = projects(context).where("projects.id", id);
  const row = await (lock ? query.forUpdate() : query).first();
  if (!row) throw noSuchRecord("project");
  return row;
}

export async function createProject(context: RecordContext, fields: z.output<typeof projectFields>): Promise<ProjectRow> {
  const id = newId("prj");
  const now = new Date();
  await addRecord(context.db, "projects", context.realm, { id, ...fields, created_at: now, updated_at: now });
  return findProject(context, id);
}

export async function listProjects(context: Reading, { q, ...page }: z.output<typeof projectsQuery>): Promise<Page<Project>> {
  const query = projects(context);
  if (q) query.where((some) => some.where("projects.name", "like", containing(q)).orWhere("projects.number", "like", containing(q)));
  const { items, next } = await pageOf(query, "projects", { column: "projects.name", direction: "asc", valueOf: ({ name }: ProjectRow) => name }, page);
  return { items: items.map(projectOf), next };
}

/** Changes what is sent. @param requireMatch Throws unless the version is the one the caller saw. */
export async function changeProject(context: RecordContext, id: string, change: z.output<typeof projectChange>, requireMatch: (version: number) => void): Promise<ProjectRow> {
  const row = await findProject(context, id, true);
  requireMatch(row.version);
  await projects(context).where("projects.id", id).update({ ...change, version: row.version + 1, updated_at: new Date() });
  return findProject(context, id);
}

export async function deleteProject(context: RecordContext, id: string, requireMatch: (version: number) => void): Promise<void> {
  const row = await findProject(context, id, true);
  requireMatch(row.version);
  const held = await recordsOf<{ id: string }>(context.db, "traverses", context.realm).where("project_id", id).first("traverses.id");
  if (held) {
    throw refusal("still-in-use", "The project holds traverses.", { code: "project_holds_traverses" });
  }
  await projects(context).where("projects.id", id).delete();
}
