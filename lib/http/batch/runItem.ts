import { batchItem, type BatchOperationName } from "@/api-spec/calculations/batch";
import { PROBLEMS } from "@/api-spec/problems";
import { OPERATIONS } from "@/api-spec/registry";
import { CALCULATIONS } from "@/lib/airflow/calculations";
import { problemBody } from "@/lib/problems/problem";
import { toProblem } from "../passage";
import { validate } from "../validation";

export interface ItemResult {
  index: number;
  status: number;
  result?: unknown;
  problem?: Record<string, unknown>;
}

const bodies = new Map(OPERATIONS.filter(({ path }) => path.startsWith("/calculations/")).map(({ path, body }) => [path.slice("/calculations/".length), body!]));

/** Runs one item of a batch. Never throws: what is wrong with an item is its result. */
export function runItem(item: unknown, index: number, requestId: string, pointer: string): ItemResult {
  let at = pointer;
  try {
    const { operation, input } = validate(batchItem, item);
    at = `${pointer}/input`;
    const calculate = CALCULATIONS[operation as BatchOperationName] as (input: unknown) => unknown;
    return { index, status: 200, result: calculate(validate(bodies.get(operation)!, input)) };
  } catch (error) {
    return failedItem(error, index, requestId, at, at === pointer ? undefined : (item as { input: unknown }).input);
  }
}

export function failedItem(error: unknown, index: number, requestId: string, pointer: string, sent?: unknown): ItemResult {
  const problem = toProblem(error, requestId, sent);
  const body = problemBody(problem, requestId);
  const errors = problem.details.errors?.map((fault) => ({ ...fault, pointer: pointer + fault.pointer }));
  return { index, status: PROBLEMS[problem.slug].status, problem: { ...body, ...(errors && { errors }) } };
}
