import { isDatabaseReady } from "@/db/ready";

/** Whether the process can do all of its work: the database answers. */
export async function GET(): Promise<Response> {
  const database = await isDatabaseReady();
  const headers: Record<string, string> = database ? { "Cache-Control": "no-store" } : { "Cache-Control": "no-store", "Retry-After": "2" };
  return Response.json({ status: database ? "ready" : "not_ready", database }, { status: database ? 200 : 503, headers });
}
export const dynamic = "force-dynamic";
