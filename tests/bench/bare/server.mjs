import { createServer } from "node:http";
import { fileURLToPath } from "node:url";
import next from "next";

const port = Number(process.env.PORT);
const app = next({ dev: false, dir: fileURLToPath(new URL(".", import.meta.url)), hostname: "127.0.0.1", port, quiet: true });
await app.prepare();
const handle = app.getRequestHandler();
createServer((request, response) => handle(request, response)).listen(port, "127.0.0.1", () => process.send?.("ready"));
process.on("SIGTERM", () => process.exit(0));
process.on("disconnect", () => process.exit(0));
