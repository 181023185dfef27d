import type { z } from "zod";
import { findSignedIn, SESSION_COOKIE, type Role, type SignedIn } from "@/lib/accounts/session";
import { newId } from "@/lib/ids/newId";
import { problemResponse, refusal } from "@/lib/problems/problem";
import { cookieOf } from "./cookies";
import type { Handler } from "./operation";
import { requireSameOrigin } from "./origin";
import { toProblem } from "./passage";
import { readBody } from "./requestBody";
import { validate } from "./validation";

/** Who may call: anyone, somebody signed in, a member with at least this role, or a platform administrator. */
export type Access = "anyone" | "signed_in" | Role | "administrator";

/** Somebody signed in who belongs to an organisation. */
export type Member = SignedIn & { organisation: NonNullable<SignedIn["organisation"]> };

type Caller<A extends Access> = A extends "anyone" ? SignedIn | null : A extends Role ? Member : SignedIn;

interface PortalDefinition<A extends Access, Body extends z.ZodType, Params extends z.ZodType, Query extends z.ZodType> {
  access: A;
  body?: Body;
  bodyMedia?: "text/csv";
  maxBodyBytes?: number;
  params?: Params;
  query?: Query;
  /** Status of a successful answer; 200 when left out. */
  status?: 200 | 201 | 202 | 204;
}

interface PortalCall<A extends Access, Body, Params, Query> {
  caller: Caller<A>;
  input: Body;
  params: Params;
  query: Query;
  userAgent: string;
}

/** What a portal operation gives: the answer's body, a cookie to set and headers of its own. */
interface PortalResult {
  body?: unknown;
  cookie?: string;
  headers?: Record<string, string>;
}

const RANK: Record<Role, number> = { viewer: 1, developer: 2, owner: 3 };

/**
 * Makes the handler of one of the portal's own routes: origin, session, role, validation, the operation, answer.
 * An operation whose answer is not JSON, such as a file, gives a Response.
 */
export function portalOperation<A extends Access, Body extends z.ZodType, Params extends z.ZodType, Query extends z.ZodType>(
  definition: PortalDefinition<A, Body, Params, Query>,
  run: (call: PortalCall<A, z.output<Body>, z.output<Params>, z.output<Query>>) => Promise<PortalResult | Response>,
): Handler {
  return async (request, context) => {
    const requestId = newId("req");
    try {
      requireSameOrigin(request);
      const call = {
        caller: await callerFor(definition.access, request),
        input: definition.body && validate(definition.body, await readBody(request, definition)),
        params: definition.params && validate(definition.params, await context.params, "path"),
        query: definition.query && validate(definition.query, Object.fromEntries(new URL(request.url).searchParams), "query"),
        userAgent: request.headers.get("user-agent") ?? "",
      } as PortalCall<A, z.output<Body>, z.output<Params>, z.output<Query>>;
      const result = await run(call);
      return asPrivate(result instanceof Response ? result : jsonResponse(result, definition.status ?? 200), requestId);
    } catch (error) {
      return asPrivate(problemResponse(toProblem(error, requestId), requestId), requestId);
    }
  };
}

function jsonResponse({ body = {}, cookie, headers }: PortalResult, status: number): Response {
  const response = new Response(status === 204 ? null : JSON.stringify(body), { status, headers: { "Content-Type": "application/json", ...headers } });
  if (cookie) response.headers.append("Set-Cookie", cookie);
  return response;
}

/** Puts on an answer the headers that every one of the portal's has; it is for the person who asked and nobody else. */
function asPrivate(response: Response, requestId: string): Response {
  response.headers.set("Cache-Control", "no-store");
  response.headers.set("X-Content-Type-Options", "nosniff");
  response.headers.set("Request-Id", requestId);
  return response;
}

async function callerFor(access: Access, request: Request): Promise<SignedIn | null> {
  const caller = await findSignedIn(cookieOf(request, SESSION_COOKIE));
  if (access === "anyone") return caller;
  if (!caller) throw refusal("not-signed-in", "Sign in first.");
  if (access === "signed_in") return caller;
  if (access === "administrator") {
    if (!caller.isAdministrator) throw refusal("role-not-sufficient", "This is for platform administrators.");
    return caller;
  }
  if (!caller.organisation || RANK[caller.organisation.role] < RANK[access]) {
    throw refusal("role-not-sufficient", `This takes the role "${access}"; yours is "${caller.organisation?.role ?? "none"}".`);
  }
  return caller;
}
