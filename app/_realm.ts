import { cookies } from "next/headers";
import { database } from "@/db/connection";
import type { Member } from "@/lib/http/portalOperation";
import { ENVIRONMENT_COOKIE, environmentFrom } from "@/lib/records/environments";
import type { RecordContext } from "@/lib/records/context";

/** What a page reads records with: the member's organisation, and the environment they chose to see. */
export async function readingOf({ organisation }: Member): Promise<Pick<RecordContext, "db" | "realm">> {
  const environment = environmentFrom((await cookies()).get(ENVIRONMENT_COOKIE)?.value);
  return { db: database(), realm: { organisationId: organisation.id, environment } };
}
