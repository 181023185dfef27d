import type { z } from "zod";
import type { OperationDefinition } from "@/api-spec/define";
import { AirflowInputError } from "@/lib/airflow/errors";
import { newId } from "@/lib/ids/newId";
import type { Key } from "@/lib/keys/keyDirectory";
import { limitHeaders, spendRequest } from "@/lib/limits/planLimits";
import { Problem, problemResponse } from "@/lib/problems/problem";
import { callerAddress } from "@/lib/runtime/caller";
import { log } from "@/lib/runtime/log";
import { usageBuffer } from "@/lib/usage/usageBuffer";
import { authorise, identifyKey } from "./authenticate";
import { isDatabaseAway } from "./databaseAway";
import { readJson } from "./requestBody";
import { impossibleInput, validate } from "./validation";

/** What an operation is given: everything validated, and the key it was called with. */
export interface Call<Body, Query, Params> {
  input: Body;
  query: Query;
  params: Params;
  /** Null only for operations that need no key. */
  key: Key | null;
  requestId: string;
}

/** A plain web handler. `params` are the parts of the path, as Next.js passes them. */
export type Handler = (request: Request, context: { params: Promise<Record<string, string>> }) => Promise<Response>;

/** What is known of a request as it goes through, for its headers, the usage count and the log. */
interface Passage {
  requestId: string;
  startedAt: number;
  clock: number;
  key: Key | null;
  limits: Record<string, string>;
}

/**
 * Makes the handler of an operation: key, limits, validation, the operation itself, answer.
 * Whatever is thrown on the way becomes a problem; whatever the outcome, it is counted.
 */
export function operation<Body extends z.ZodType, Answer extends z.ZodType, Query extends z.ZodType, Params extends z.ZodType>(
  definition: OperationDefinition<Body, Answer, Query, Params>,
  run: (call: Call<z.output<Body>, z.output<Query>, z.output<Params>>) => z.input<Answer> | Promise<z.input<Answer>>,
): Handler {
  return async (request, context) => {
    const passage: Passage = { requestId: newId("req"), startedAt: Date.now(), clock: performance.now(), key: null, limits: {} };
    try {
      await admit(request, definition, passage);
      const call = {
        input: definition.body && validate(definition.body, await readJson(request, definition.maxBodyBytes)),
        query: definition.query && validate(definition.query, Object.fromEntries(new URL(request.url).searchParams), "query"),
        params: definition.params && validate(definition.params, await context.params, "path"),
        key: passage.key,
        requestId: passage.requestId,
      } as Call<z.output<Body>, z.output<Query>, z.output<Params>>;
      const answer = await run(call);
      const body = definition.status === 204 ? null : JSON.stringify(answer);
      const response = new Response(body, { status: definition.status ?? 200, headers: { "Content-Type": "application/json" } });
      return finish(response, definition, passage, null);
    } catch (error) {
      const problem = toProblem(error, passage.requestId);
      return finish(problemResponse(problem, passage.requestId), definition, passage, problem.slug);
    }
  };
}

/** Lets a request through to an operation that needs a key, or throws the problem that keeps it out. */
async function admit(request: Request, definition: OperationDefinition, passage: Passage): Promise<void> {
  if (definition.scope === null) return;
  passage.key = await identifyKey(request);
  authorise(passage.key, definition.scope, passage.startedAt);
  passage.limits = limitHeaders(await spendRequest(passage.key, passage.startedAt), passage.startedAt);
}

/** The problem to answer with. What the caller did not cause is logged, and told without particulars. */
export function toProblem(error: unknown, requestId: string): Problem {
  if (error instanceof Problem) return error;
  if (error instanceof AirflowInputError) return impossibleInput(error);
  if (isDatabaseAway(error)) {
    log().warn({ err: error, requestId }, "the database does not answer");
    return new Problem("temporarily-unavailable", { detail: "The database does not answer. Nothing was stored; repeat the request.", headers: { "Retry-After": "2" } });
  }
  log().error({ err: error, requestId }, "a request failed");
  return new Problem("internal-error", { detail: "The request could not be completed. The cause is in our log under this request id." });
}

function finish(response: Response, definition: OperationDefinition, passage: Passage, problem: string | null): Response {
  const { key, requestId } = passage;
  response.headers.set("Request-Id", requestId);
  for (const [name, value] of Object.entries(passage.limits)) response.headers.set(name, value);
  const microseconds = Math.round((performance.now() - passage.clock) * 1_000);
  usageBuffer().count({
    requestId,
    organisationId: key?.organisationId ?? "",
    keyId: key?.id ?? "",
    environment: key?.environment ?? "none",
    operation: definition.id,
    status: response.status,
    problem,
    address: callerAddress() ?? "",
    items: 1,
    microseconds,
    at: passage.startedAt,
  });
  log().debug({ requestId, operation: definition.id, status: response.status, problem, microseconds }, "answered");
  return response;
}
