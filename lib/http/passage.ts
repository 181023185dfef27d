import type { OperationDefinition } from "@/api-spec/define";
import { AirflowInputError } from "@/lib/airflow/errors";
import { newId } from "@/lib/ids/newId";
import type { Key } from "@/lib/keys/keyDirectory";
import { limitHeaders, spendRequest } from "@/lib/limits/planLimits";
import { Problem } from "@/lib/problems/problem";
import { callerAddress } from "@/lib/runtime/caller";
import { log } from "@/lib/runtime/log";
import { usageBuffer } from "@/lib/usage/usageBuffer";
import { authorise, identifyKey } from "./authenticate";
import { isDatabaseAway } from "./databaseAway";
import { impossibleInput } from "./validation";

/** What is known of a request as it goes through, for its headers, the usage count and the log. */
export interface Passage {
  requestId: string;
  startedAt: number;
  clock: number;
  address: string;
  key: Key | null;
  limits: Record<string, string>;
  /** Calculations asked for: one, but for a batch. */
  items: number;
  /** The body, once it was read. */
  sent?: unknown;
}

export const beginPassage = (): Passage => ({
  requestId: newId("req"),
  startedAt: Date.now(),
  clock: performance.now(),
  address: callerAddress() ?? "",
  key: null,
  limits: {},
  items: 1,
});

/** Lets a request through to an operation that needs a key, or throws the problem that keeps it out. */
export async function admit(request: Request, definition: OperationDefinition, passage: Passage): Promise<void> {
  if (definition.scope === null) return;
  passage.key = await identifyKey(request);
  authorise(passage.key, definition.scope, passage.startedAt);
  passage.limits = limitHeaders(await spendRequest(passage.key, passage.startedAt), passage.startedAt);
}

/** The headers that every answer has. */
export const passageHeaders = (passage: Passage): Record<string, string> => ({ ...passage.limits, "Request-Id": passage.requestId, "X-Content-Type-Options": "nosniff" });

/** Puts on an answer made elsewhere the headers that every answer has. */
export function withHeaders(response: Response, passage: Passage): Response {
  for (const [name, value] of Object.entries(passageHeaders(passage))) response.headers.set(name, value);
  return response;
}

/** A JSON answer with the headers that every answer has. */
export const jsonAnswer = (answer: unknown, status: number, passage: Passage): Response => wholeAnswer(JSON.stringify(answer), status, { ...passageHeaders(passage), "Content-Type": "application/json" });

/** A drawing with the headers that every answer has. */
export const svgAnswer = (drawing: string, passage: Passage): Response =>
  wholeAnswer(drawing, 200, { ...passageHeaders(passage), "Content-Type": "image/svg+xml; charset=utf-8", "Content-Security-Policy": "default-src 'none'; style-src 'unsafe-inline'", Vary: "Accept" });

/**
 * An answer whose body is at hand, in one piece.
 * A response makes a stream of bytes of a string or a buffer, which costs several times as much to pass on.
 */
function wholeAnswer(text: string, status: number, headers: Record<string, string>): Response {
  const bytes = Buffer.from(text);
  const body = new ReadableStream({
    start(controller) {
      controller.enqueue(bytes);
      controller.close();
    },
  });
  return new Response(body, { status, headers });
}

/** Counts a request once its outcome is known. */
export function endPassage(definition: OperationDefinition, passage: Passage, status: number, problem: string | null): void {
  const { key, requestId } = passage;
  const microseconds = Math.round((performance.now() - passage.clock) * 1_000);
  usageBuffer().count({
    requestId,
    organisationId: key?.organisationId ?? "",
    keyId: key?.id ?? "",
    environment: key?.environment ?? "none",
    operation: definition.id,
    status,
    problem,
    address: passage.address,
    items: passage.items,
    microseconds,
    at: passage.startedAt,
  });
  log().debug({ requestId, operation: definition.id, status, problem, microseconds }, "answered");
}

/** The problem to answer with. What the caller did not cause is logged, and told without particulars. */
export function toProblem(error: unknown, requestId: string, sent?: unknown): Problem {
  if (error instanceof Problem) return error;
  if (error instanceof AirflowInputError) return impossibleInput(error, sent);
  if (isDatabaseAway(error)) {
    log().warn({ err: error, requestId }, "the database does not answer");
    return new Problem("temporarily-unavailable", { detail: "The database does not answer. Nothing was stored; repeat the request.", headers: { "Retry-After": "2" } });
  }
  log().error({ err: error, requestId }, "a request failed");
  return new Problem("internal-error", { detail: "The request could not be completed. The cause is in our log under this request id." });
}
