import document from "@/api-spec/openapi.json";

/** The OpenAPI document, as generated and committed. */
export const GET = (): Response => Response.json(document, { headers: { "Cache-Control": "public, max-age=300" } });
