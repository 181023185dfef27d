import type { z } from "zod";
import { database } from "@/db/connection";
import { ENVIRONMENT_COOKIE, environmentFrom } from "@/lib/records/environments";
import type { RecordContext } from "@/lib/records/context";
import { cookieOf } from "./cookies";
import type { Handler } from "./operation";
import { portalOperation, type Member } from "./portalOperation";
import { inTransaction } from "./recordOperation";

interface Definition<Body extends z.ZodType, Params extends z.ZodType, Query extends z.ZodType> {
  access: "viewer" | "developer" | "owner";
  body?: Body;
  bodyMedia?: "text/csv";
  maxBodyBytes?: number;
  params?: Params;
  query?: Query;
  status?: 200 | 201 | 204;
}

interface PortalRecordCall<Body, Params, Query> extends RecordContext {
  caller: Member;
  input: Body;
  params: Params;
  query: Query;
}

/**
 * A change to records by a person in the portal: in the environment they see, in one transaction, under their name.
 * @param prepare What takes long and changes nothing: done before the transaction, so that it holds no connection and no lock.
 */
export function portalRecordOperation<Body extends z.ZodType, Params extends z.ZodType, Query extends z.ZodType = z.ZodType, Prepared = undefined>(
  definition: Definition<Body, Params, Query>,
  run: (call: PortalRecordCall<z.output<Body>, z.output<Params>, z.output<Query>>, prepared: Prepared) => Promise<unknown>,
  prepare?: (call: PortalRecordCall<z.output<Body>, z.output<Params>, z.output<Query>>) => Promise<Prepared>,
): Handler {
  return (request, context) => {
    const environment = environmentFrom(cookieOf(request, ENVIRONMENT_COOKIE));
    const handler = portalOperation(definition, async ({ caller, input, params, query }) => {
      const realm = { organisationId: caller.organisation.id, environment };
      const call = { db: database(), realm, by: { userId: caller.userId }, caller, input, params, query };
      const prepared = (await prepare?.(call)) as Prepared;
      return { body: await inTransaction((db) => run({ ...call, db }, prepared)) };
    });
    return handler(request, context);
  };
}

/** A file made of a record, for any member who asks for it. */
export function portalFile<Params extends z.ZodType>(params: Params, make: (reading: Pick<RecordContext, "db" | "realm">, params: z.output<Params>) => Promise<Response>): Handler {
  return (request, context) => {
    const environment = environmentFrom(cookieOf(request, ENVIRONMENT_COOKIE));
    const handler = portalOperation({ access: "viewer", params }, ({ caller, params: given }) => make({ db: database(), realm: { organisationId: caller.organisation.id, environment } }, given));
    return handler(request, context);
  };
}
