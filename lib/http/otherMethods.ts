import { newId } from "@/lib/ids/newId";
import { Problem, problemResponse, refusal } from "@/lib/problems/problem";


export type Method = "GET" | "POST" | "PUT" | "PATCH" | "DELETE";

const answerWith = (problem: Problem): (() => Promise<Response>) => async () => {
  const requestId = newId("req");
  const response = problemResponse(problem, requestId);
  response.headers.set("Request-Id", requestId);
  return response;
};

/** Handlers for the methods a path does not take, so that these too answer with a problem. */
export function otherMethods(...taken: Method[]): Record<Method, () => Promise<Response>> {
  const detail = `This path takes ${taken.join(" and ")} only.`;
  const refuse = answerWith(
    refusal("method-not-allowed", detail, {}, { Allow: taken.join(", ") }),
  );
  return { GET: refuse, POST: refuse, PUT: refuse, PATCH: refuse, DELETE: refuse };
}

/** The handler of every path below the API that leads nowhere. */
export const noSuchPath = answerWith(
  new Problem("not-found", {
    detail: "No operation has this path. The reference lists them all.",
    errors: [{ pointer: "", code: "not_found", detail: "No operation has this path." }],
  }),
);
