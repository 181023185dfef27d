import type { z } from "zod";
import type { OperationDefinition } from "@/api-spec/define";
import type { Key } from "@/lib/keys/keyDirectory";
import { problemResponse } from "@/lib/problems/problem";
import { admit, beginPassage, endPassage, jsonAnswer, passageHeaders, svgAnswer, toProblem, withHeaders, type Passage } from "./passage";
import { readBody } from "./requestBody";
import { validate } from "./validation";

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

type Context = Parameters<Handler>[1];

/** Everything that the caller sent, validated. */
export async function readCall<Body extends z.ZodType, Answer extends z.ZodType, Query extends z.ZodType, Params extends z.ZodType>(
  definition: OperationDefinition<Body, Answer, Query, Params>,
  request: Request,
  context: Context,
  passage: Passage,
): Promise<Call<z.output<Body>, z.output<Query>, z.output<Params>>> {
  if (definition.body) passage.sent = await readBody(request, definition);
  return {
    input: definition.body && validate(definition.body, passage.sent),
    query: definition.query && validate(definition.query, Object.fromEntries(new URL(request.url).searchParams), "query"),
    params: definition.params && validate(definition.params, await context.params, "path"),
    key: passage.key,
    requestId: passage.requestId,
  } as Call<z.output<Body>, z.output<Query>, z.output<Params>>;
}

/** Whether the caller asks for the drawing and not, or not rather, for JSON. */
function prefersSvg(request: Request): boolean {
  const accept = request.headers.get("accept") ?? "";
  const [svg, json] = [accept.indexOf("image/svg+xml"), accept.indexOf("application/json")];
  return svg >= 0 && (json < 0 || svg < json);
}

/**
 * Makes the handler of an operation: key, limits, validation, the operation itself, answer.
 * Whatever is thrown on the way becomes a problem; whatever the outcome, it is counted.
 */
export function operation<Body extends z.ZodType, Answer extends z.ZodType, Query extends z.ZodType, Params extends z.ZodType>(
  definition: OperationDefinition<Body, Answer, Query, Params>,
  run: (call: Call<z.output<Body>, z.output<Query>, z.output<Params>>) => z.input<Answer> | Promise<z.input<Answer>>,
  /** Draws the answer, for operations whose definition has a figure. */
  draw?: (input: z.output<Body>, answer: z.input<Answer>) => string,
): Handler {
  return async (request, context) => {
    const passage = beginPassage();
    try {
      await admit(request, definition, passage);
      const call = await readCall(definition, request, context, passage);
      const answer = await run(call);
      const status = definition.status ?? 200;
      const response =
        draw && prefersSvg(request) ? svgAnswer(draw(call.input, answer), passage)
        : status === 204 ? new Response(null, { status, headers: passageHeaders(passage) })
        : jsonAnswer(answer, status, passage);
      endPassage(definition, passage, status, null);
      return response;
    } catch (error) {
      const problem = toProblem(error, passage.requestId, passage.sent);
      const response = problemResponse(problem, passage.requestId);
      endPassage(definition, passage, response.status, problem.slug);
      return withHeaders(response, passage);
    }
  };
}
