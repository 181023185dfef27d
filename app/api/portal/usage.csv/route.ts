import { usageFilter } from "@/app/(portal)/usage/filter";
import { findSignedIn, SESSION_COOKIE } from "@/lib/accounts/session";
import { cookieOf } from "@/lib/http/cookies";
import { usageCsv } from "@/lib/usage/usageCsv";

/** The usage that the page shows, as a file. */
export async function GET(request: Request): Promise<Response> {
  const person = await findSignedIn(cookieOf(request, SESSION_COOKIE));
  if (!person?.organisation) return new Response(null, { status: 303, headers: { Location: "/sign-in?next=/usage" } });
  const filter = usageFilter(person.organisation.id, Object.fromEntries(new URL(request.url).searchParams));
  return new Response(await usageCsv(filter), {
    headers: { "Content-Type": "text/csv; charset=utf-8", "Content-Disposition": `attachment; filename="usage-${filter.from}-${filter.to}.csv"`, "Cache-Control": "no-store" },
  });
}
