import { PROBLEMS, type ProblemSlug } from "@/api-spec/problems";
import { config } from "@/lib/runtime/config";

/** One fault of a request. `pointer` is a JSON Pointer into the body; "" stands for the request as a whole. */
export interface ProblemFault {
  pointer: string;
  code: string;
  detail: string;
  /** The header or query parameter at fault, where it is not the body. */
  header?: string;
  parameter?: string;
  /** The row and column at fault, where the body is a CSV file. */
  row?: number;
  column?: string | null;
}

interface ProblemDetails {
  detail: string;
  errors?: ProblemFault[];
  headers?: Record<string, string>;
}

/** Thrown anywhere under an operation to answer with a problem. */
export class Problem extends Error {
  constructor(readonly slug: ProblemSlug, readonly details: ProblemDetails) {
    super(details.detail);
    this.name = "Problem";
  }
}

/**
 * The problem of a request as a whole.
 * @param at The place at fault, where there is one, and the fault's code, where it is not that of the problem.
 */
export const refusal = (slug: ProblemSlug, detail: string, at: Partial<Omit<ProblemFault, "detail">> = {}, headers?: Record<string, string>): Problem =>
  new Problem(slug, { detail, errors: [{ pointer: "", code: slug.replaceAll("-", "_"), ...at, detail }], ...(headers && { headers }) });

/** A JSON Pointer (RFC 6901) from a path. */
export const pointerTo = (path: readonly PropertyKey[]): string =>
  path.map((part) => `/${String(part).replaceAll("~", "~0").replaceAll("/", "~1")}`).join("");

/** The body of a problem (RFC 9457). */
export function problemBody(problem: Problem, requestId: string): Record<string, unknown> {
  const { status, title } = PROBLEMS[problem.slug];
  const { detail, errors } = problem.details;
  return { type: `${config().AVERDUCT_URL}/docs/problems/${problem.slug}`, title, status, detail, requestId, ...(errors && { errors }) };
}

export function problemResponse(problem: Problem, requestId: string): Response {
  return new Response(JSON.stringify(problemBody(problem, requestId)), {
    status: PROBLEMS[problem.slug].status,
    headers: { ...problem.details.headers, "Content-Type": "application/problem+json", "Cache-Control": "no-store" },
  });
}
