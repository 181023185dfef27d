import { setImmediate } from "node:timers/promises";
import { batch } from "@/api-spec/calculations/batch";
import { spendItems } from "@/lib/limits/planLimits";
import { problemResponse } from "@/lib/problems/problem";
import type { Handler } from "../operation";
import { admit, beginPassage, endPassage, jsonAnswer, toProblem, withHeaders, type Passage } from "../passage";
import { readJson } from "../requestBody";
import { validate } from "../validation";
import { runItem, type ItemResult } from "./runItem";
import { streamedBatch } from "./streamedBatch";

/** After so long others are given a turn. */
const TURN_MS = 10;

const NDJSON = /^application\/x-ndjson\b/i;

/** The batch operation: one JSON body, or lines answered while they arrive, as the content type says. */
export const batchOperation: Handler = async (request) => {
  const passage = beginPassage();
  try {
    await admit(request, batch, passage);
    if (NDJSON.test(request.headers.get("content-type") ?? "")) return streamedBatch(request, passage);
    const response = await wholeBatch(request, passage);
    endPassage(batch, passage, response.status, null);
    return response;
  } catch (error) {
    const problem = toProblem(error, passage.requestId);
    const response = problemResponse(problem, passage.requestId);
    endPassage(batch, passage, response.status, problem.slug);
    return withHeaders(response, passage);
  }
};

async function wholeBatch(request: Request, passage: Passage): Promise<Response> {
  const { items } = validate(batch.body!, await readJson(request, batch.maxBodyBytes));
  // The request itself is already counted as one.
  if (items.length > 1) await spendItems(passage.key!, items.length - 1, passage.startedAt);
  passage.items = items.length;
  const results: ItemResult[] = [];
  let turn = performance.now();
  for (const [index, item] of items.entries()) {
    results.push(runItem(item, index, passage.requestId, `/items/${index}`));
    if (performance.now() - turn > TURN_MS) {
      await setImmediate();
      turn = performance.now();
    }
  }
  return jsonAnswer({ items: results }, 200, passage);
}
