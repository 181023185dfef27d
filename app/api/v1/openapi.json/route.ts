import { readFileSync } from "node:fs";
import path from "node:path";

// Read, not imported: a bundler may rewrite the numbers of a JSON module in their last digit.
const document = readFileSync(path.join(process.cwd(), "api-spec/openapi.json"));

/** The OpenAPI document, as generated and committed. */
export const GET = (): Response => new Response(document, { headers: { "Content-Type": "application/json", "Cache-Control": "public, max-age=300" } });
