import type { z } from "zod";
import type { ProblemSlug } from "./problems";

/** What a key may be allowed to do. */
export const SCOPES = {
  calculations: "Run calculations; nothing is stored.",
  "records:read": "Read projects, instruments and traverses.",
  "records:write": "Create and change drafts, projects and instruments.",
  "records:issue": "Issue, void and revise traverses.",
  webhooks: "Manage webhook endpoints and read events.",
  "usage:read": "Read the organisation's own usage.",
} as const;
export type Scope = keyof typeof SCOPES;

/** A request that really runs: tests send it, the reference shows it with the answer the engine gives. */
export interface Example<Body> {
  name: string;
  summary: string;
  body: Body;
}

type AnswerMedia = "image/svg+xml" | "image/jpeg" | "image/png" | "application/pdf" | "text/csv" | "application/x-ndjson";

/**
 * The one definition of an operation. Validation, types, the OpenAPI document, the reference page and the
 * examples' tests all come from it.
 */
export interface OperationDefinition<
  Body extends z.ZodType = z.ZodType,
  Answer extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Params extends z.ZodType = z.ZodType,
> {
  /** camelCase, unique; the `operationId`. */
  id: string;
  method: "get" | "post" | "put" | "patch" | "delete";
  /** Below `/api/v1`, with `{name}` for path parameters. */
  path: `/${string}`;
  tag: string;
  /** Scope that the key needs; null where no key is asked for. */
  scope: Scope | null;
  summary: string;
  /** For a technician, in Markdown. */
  description: string;
  body?: Body;
  query?: Query;
  params?: Params;
  answer: Answer;
  /** Status of a successful answer; 200 when left out. */
  status?: 200 | 201 | 202 | 204;
  examples?: Example<z.input<Body>>[];
  /** Problems beyond those that authentication, limits and validation bring by themselves. */
  problems?: ProblemSlug[];
  /** What the drawing shows, where the answer can also be had as one with `Accept: image/svg+xml`. */
  figure?: string;
  /** Reads and changes a record that has a version: the answer has an ETag, and a change takes If-Match. */
  versioned?: boolean;
  /** Media type of the answer where it is not JSON; several where the request says which. */
  media?: AnswerMedia | readonly AnswerMedia[];
  /** Media type of the body where it is not JSON; its schema is then that of the text. */
  bodyMedia?: "text/csv";
  /** The parts of the form, where the body is one with a file (`multipart/form-data`); the operation reads it itself. */
  form?: z.ZodType;
  /** Largest accepted body; 1 MiB when left out. */
  maxBodyBytes?: number;
}

/** Registers nothing by itself: `registry.ts` lists the definitions. It only fixes the types. */
export const defineOperation = <
  Body extends z.ZodType,
  Answer extends z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Params extends z.ZodType = z.ZodType,
>(
  definition: OperationDefinition<Body, Answer, Query, Params>,
): OperationDefinition<Body, Answer, Query, Params> => definition;
