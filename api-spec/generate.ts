import { writeFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { openApiText } from "./document";

/** Writes the committed OpenAPI document anew from the definitions. */
export async function main(): Promise<void> {
  writeFileSync(fileURLToPath(new URL("./openapi.json", import.meta.url)), openApiText());
  console.log("api-spec/openapi.json is up to date.");
}
