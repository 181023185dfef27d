import { writeFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { openApiText } from "./document";

writeFileSync(fileURLToPath(new URL("./openapi.json", import.meta.url)), openApiText());
console.log("api-spec/openapi.json is up to date.");
