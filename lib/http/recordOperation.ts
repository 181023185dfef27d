import type { Knex } from "knex";
import type { z } from "zod";
import { database } from "@/db/connection";
import type { OperationDefinition } from "@/api-spec/define";
import type { RecordContext } from "@/lib/records/context";
import { problemResponse, refusal } from "@/lib/problems/problem";
import { claimIdempotencyKey, fingerprintOf, idempotencyKeyOf, keepAnswer, type KeptAnswer } from "./idempotency";
import { readCall, type Call, type Handler } from "./operation";
import { admit, beginPassage, endPassage, toProblem, withHeaders } from "./passage";

/** What an operation on records is given: the call, and the transaction, realm and actor its work is done with. */
export interface RecordCall<Body, Query, Params> extends Call<Body, Query, Params>, RecordContext {
  /** Throws unless the caller's If-Match, where there is one, names this version. */
  requireMatch: (version: number) => void;
}

/** What it gives: the answer's body, the version for its ETag, the address of what was made. */
export interface RecordResult<Answer> {
  body: Answer;
  version?: number;
  location?: string;
}

const MOST_TRIES = 4;

/** What may be done before the transaction begins, so that what takes long holds no connection and no lock. */
type Prepare<Body, Query, Params, Prepared> = (call: RecordCall<Body, Query, Params>) => Promise<Prepared>;

/**
 * Makes the handler of an operation on records. A change is one transaction, committed before it is answered; with an
 * Idempotency-Key it is done once, however often it is sent.
 */
export function recordOperation<Body extends z.ZodType, Answer extends z.ZodType, Query extends z.ZodType, Params extends z.ZodType, Prepared = undefined>(
  definition: OperationDefinition<Body, Answer, Query, Params>,
  /** An operation whose answer is not JSON, such as a drawing, gives a Response. */
  run: (call: RecordCall<z.output<Body>, z.output<Query>, z.output<Params>>, prepared: Prepared) => Promise<RecordResult<z.input<Answer>> | Response>,
  prepare?: Prepare<z.output<Body>, z.output<Query>, z.output<Params>, Prepared>,
): Handler {
  return async (request, context) => {
    const passage = beginPassage();
    try {
      await admit(request, definition, passage);
      const call = await readCall(definition, request, context, passage);
      const { id: apiKeyId, organisationId, environment } = passage.key!;
      const realm = { organisationId, environment };
      const recordCall = { ...call, db: database(), realm, by: { apiKeyId }, requireMatch: matcher(request) };
      const prepared = (await prepare?.(recordCall)) as Prepared;
      const runWith = (db: Knex) => run({ ...recordCall, db }, prepared);
      const response = definition.method === "get" ? read(request, definition, await runWith(database())) : asResponse(await once(request, realm, call.input, async (db) => kept(await runWith(db), definition)));
      endPassage(definition, passage, response.status, null);
      return withHeaders(response, passage);
    } catch (error) {
      const problem = toProblem(error, passage.requestId, passage.sent);
      const response = problemResponse(problem, passage.requestId);
      endPassage(definition, passage, response.status, problem.slug);
      return withHeaders(response, passage);
    }
  };
}

function pathAndQuery(request: Request): string {
  const { pathname, search } = new URL(request.url);
  return pathname + search;
}

const asResponse = ({ status, text, headers }: KeptAnswer): Response => new Response(status === 204 ? null : text, { status, headers });

function read(request: Request, definition: OperationDefinition, result: RecordResult<unknown> | Response): Response {
  if (result instanceof Response) return result;
  const answer = kept(result, definition);
  return notModified(request, answer) ?? asResponse(answer);
}

/** Does the work in a transaction, and, with an Idempotency-Key, does it a single time. */
async function once(request: Request, realm: RecordContext["realm"], input: unknown, work: (db: Knex) => Promise<KeptAnswer>): Promise<KeptAnswer> {
  const key = request.method === "POST" ? idempotencyKeyOf(request) : null;
  if (key === null) return inTransaction(work);
  const fingerprint = fingerprintOf(request.method, pathAndQuery(request), input);
  return inTransaction(async (db) => {
    const before = await claimIdempotencyKey(db, realm, key, fingerprint);
    if (before) return before;
    const answer = await work(db);
    await keepAnswer(db, realm, key, answer);
    return answer;
  });
}

/** Runs work in a transaction. Where two got in each other's way, the loser's was undone whole, and is done again. */
export async function inTransaction<Result>(work: (db: Knex) => Promise<Result>): Promise<Result> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await database().transaction(work, { isolationLevel: "read committed" });
    } catch (error) {
      if ((error as { code?: string }).code !== "ER_LOCK_DEADLOCK" || attempt === MOST_TRIES) throw error;
      await new Promise((resolve) => setTimeout(resolve, attempt * 20 * Math.random()));
    }
  }
}

const etagOf = (version: number): string => `"${version}"`;

function matcher(request: Request): (version: number) => void {
  const given = request.headers.get("if-match");
  return (version) => {
    if (given === null || given.trim() === "*") return;
    if (given.split(",").some((tag) => tag.trim() === etagOf(version))) return;
    throw refusal("precondition-failed", `If-Match is ${given}; the record is now at ${etagOf(version)}.`, { header: "If-Match" }, { ETag: etagOf(version) });
  };
}

function kept(result: RecordResult<unknown> | Response, definition: OperationDefinition): KeptAnswer {
  if (result instanceof Response) throw new TypeError("a change is answered with JSON, so that its answer can be kept");
  const { body, version, location } = result;
  return {
    status: definition.status ?? 200,
    headers: {
      ...(definition.status !== 204 && { "Content-Type": "application/json" }),
      "Cache-Control": "private, no-cache",
      ...(version !== undefined && { ETag: etagOf(version) }),
      ...(location && { Location: `/api/v1${location}` }),
    },
    text: JSON.stringify(body),
  };
}

function notModified(request: Request, answer: KeptAnswer): Response | null {
  const seen = request.headers.get("if-none-match");
  const etag = answer.headers["ETag"];
  if (seen === null || etag === undefined || !seen.split(",").some((tag) => tag.trim().replace(/^W\//, "") === etag)) return null;
  return new Response(null, { status: 304, headers: { ETag: etag, "Cache-Control": "private, no-cache" } });
}
