import { z } from "zod";
import { defineOperation } from "../define";
import { line, page, pageQuery, projectId, times } from "./common";

const TAG = "Projects";
const fields = {
  name: line(160).describe("What the job is called."),
  number: line(60).nullish().describe("The firm's own number of the job."),
  location: line(300).nullish().describe("Where the building is."),
  notes: z.string().trim().max(4_000).nullish(),
};
const params = z.strictObject({ id: projectId });

export const projectAnswer = z
  .strictObject({ id: projectId, name: z.string(), number: z.string().nullable(), location: z.string().nullable(), notes: z.string().nullable(), ...times })
  .meta({ id: "Project", description: "A job that traverses belong to." });

export const projectFields = z.strictObject(fields).meta({ id: "ProjectFields", description: "A project to be made." });
export const projectChange = projectFields.partial().meta({ id: "ProjectChange", description: "What is to change of a project; null clears a field." });
export const projectsQuery = z.strictObject({ ...pageQuery, q: z.string().trim().max(160).optional().describe("Only projects with this in their name or number.") });

export const createProject = defineOperation({
  id: "createProject", method: "post", path: "/projects", tag: TAG, scope: "records:write", status: 201, versioned: true,
  summary: "Make a project",
  description: "Makes a project in the key's environment. Send an `Idempotency-Key` to be able to repeat the request safely.",
  body: projectFields,
  answer: projectAnswer,
});

export const listProjects = defineOperation({
  id: "listProjects", method: "get", path: "/projects", tag: TAG, scope: "records:read",
  summary: "List projects",
  description: "The projects of the key's environment, by name.",
  query: projectsQuery,
  answer: page(projectAnswer),
});

export const readProject = defineOperation({
  id: "readProject", method: "get", path: "/projects/{id}", tag: TAG, scope: "records:read", versioned: true,
  summary: "Read a project",
  description: "One project.",
  params,
  answer: projectAnswer,
  problems: ["not-found"],
});

export const changeProject = defineOperation({
  id: "changeProject", method: "patch", path: "/projects/{id}", tag: TAG, scope: "records:write", versioned: true,
  summary: "Change a project",
  description: "Changes the fields that are sent and leaves the others. What was issued keeps the project's name of the day.",
  params,
  body: projectChange,
  answer: projectAnswer,
  problems: ["not-found", "precondition-failed"],
});

export const deleteProject = defineOperation({
  id: "deleteProject", method: "delete", path: "/projects/{id}", tag: TAG, scope: "records:write", status: 204, versioned: true,
  summary: "Delete a project",
  description: "Deletes a project that holds no traverses.",
  params,
  answer: z.null(),
  problems: ["not-found", "still-in-use", "precondition-failed"],
});
