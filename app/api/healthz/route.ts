/** Whether the process answers at all. */
export const GET = (): Response => Response.json({ status: "ok" }, { headers: { "Cache-Control": "no-store" } });
export const dynamic = "force-dynamic";
