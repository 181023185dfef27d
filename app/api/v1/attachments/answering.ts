import type { OperationDefinition } from "@/api-spec/define";
import type { Handler } from "@/lib/http/operation";
import { admit, beginPassage, endPassage, toProblem, withHeaders, type Passage } from "@/lib/http/passage";
import { problemResponse } from "@/lib/problems/problem";

/** Makes the handler of an operation whose request or answer is not JSON: key, limits, headers and count as everywhere. */
export const answering = (definition: OperationDefinition, run: (request: Request, params: Record<string, string>, passage: Passage) => Promise<Response>): Handler =>
  async (request, context) => {
    const passage = beginPassage();
    try {
      await admit(request, definition, passage);
      const response = await run(request, await context.params, passage);
      endPassage(definition, passage, response.status, null);
      return withHeaders(response, passage);
    } catch (error) {
      const problem = toProblem(error, passage.requestId);
      const response = problemResponse(problem, passage.requestId);
      endPassage(definition, passage, response.status, problem.slug);
      return withHeaders(response, passage);
    }
  };
