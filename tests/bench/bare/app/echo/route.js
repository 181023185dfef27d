/** What everything is measured against: parse the body, send it back. */
export async function POST(request) {
  return Response.json(await request.json());
}
