import type { z } from "zod";
import { findSignedIn, SESSION_COOKIE, type Role, type SignedIn } from "@/lib/accounts/session";
import { newId } from "@/lib/ids/newId";
import { Problem, problemResponse } from "@/lib/problems/problem";
import type { ProblemSlug } from "@/api-spec/problems";
import { cookieOf } from "./cookies";
import type { Handler } from "./operation";
import { requireSameOrigin } from "./origin";
import { toProblem } from "./passage";
import { readJson } from "./requestBody";
import { validate } from "./validation";

/** Who may call: anyone, somebody signed in, a member with at least this role, or a platform administrator. */
export type Access = "anyone" | "signed_in" | Role | "administrator";

/** Somebody signed in who belongs to an organisation. */
export type Member = SignedIn & { organisation: NonNullable<SignedIn["organisation"]> };

type Caller<A extends Access> = A extends "anyone" ? SignedIn | null : A extends Role ? Member : SignedIn;

interface PortalDefinition<A extends Access, Body extends z.ZodType, Params extends z.ZodType> {
  access: A;
  body?: Body;
  params?: Params;
  /** Status of a successful answer; 200 when left out. */
  status?: 200 | 201 | 202 | 204;
}

interface PortalCall<A extends Access, Body, Params> {
  caller: Caller<A>;
  input: Body;
  params: Params;
  userAgent: string;
}

/** What a portal operation gives: the answer's body, and cookies to set. */
interface PortalResult {
  body?: unknown;
  cookie?: string;
}

const RANK: Record<Role, number> = { viewer: 1, developer: 2, owner: 3 };

/** Makes the handler of one of the portal's own routes: origin, session, role, validation, the operation, answer. */
export function portalOperation<A extends Access, Body extends z.ZodType, Params extends z.ZodType>(
  definition: PortalDefinition<A, Body, Params>,
  run: (call: PortalCall<A, z.output<Body>, z.output<Params>>) => Promise<PortalResult>,
): Handler {
  return async (request, context) => {
    const requestId = newId("req");
    try {
      requireSameOrigin(request);
      const caller = await callerFor(definition.access, request);
      const input = definition.body && validate(definition.body, await readJson(request));
      const params = definition.params && validate(definition.params, await context.params, "path");
      const call = { caller, input, params, userAgent: request.headers.get("user-agent") ?? "" } as PortalCall<A, z.output<Body>, z.output<Params>>;
      const { body = {}, cookie } = await run(call);
      const status = definition.status ?? 200;
      const headers: Record<string, string> = { "Content-Type": "application/json", "Cache-Control": "no-store", "Request-Id": requestId };
      if (cookie) headers["Set-Cookie"] = cookie;
      return new Response(status === 204 ? null : JSON.stringify(body), { status, headers });
    } catch (error) {
      const response = problemResponse(toProblem(error, requestId), requestId);
      response.headers.set("Request-Id", requestId);
      return response;
    }
  };
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

const refusal = (slug: ProblemSlug, detail: string): Problem => new Problem(slug, { detail, errors: [{ pointer: "", code: slug.replaceAll("-", "_"), detail }] });
