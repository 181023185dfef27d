import { jwks } from "@/lib/signing/signingKeys";

/** The public keys that records are signed with: the present one and all before it. */
export async function GET(): Promise<Response> {
  return Response.json(await jwks(), { headers: { "Cache-Control": "public, max-age=300", "Access-Control-Allow-Origin": "*" } });
}
