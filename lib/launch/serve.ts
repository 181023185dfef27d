// The application server: Next.js behind a plain HTTP server that knows the caller's address and how to stop.
import { createServer, type IncomingMessage, type Server } from "node:http";
import next from "next";
import { setTimeout as pause } from "node:timers/promises";
import { withCaller } from "@/lib/runtime/caller";
import { config } from "@/lib/runtime/config";
import { log } from "@/lib/runtime/log";
import { runShutdownTasks } from "@/lib/runtime/shutdown";
import { startWebhooks } from "@/lib/webhooks/worker";
import { startHousekeeping } from "./housekeeping";
import { mountCalculations } from "./mounted";

/** Requests that are still running after this are cut off. */
const STOP_TIMEOUT_MS = 9_000;

/** The address of whoever called: the socket's, or what the nearest trusted proxy says. */
function addressOf(request: IncomingMessage): string {
  const { TRUSTED_PROXIES } = config();
  const forwarded = String(request.headers["x-forwarded-for"] ?? "").split(",").map((part) => part.trim()).filter(Boolean);
  const named = TRUSTED_PROXIES > 0 ? forwarded.at(-TRUSTED_PROXIES) : undefined;
  return (named ?? request.socket.remoteAddress ?? "").replace(/^::ffff:/, "");
}

async function serve(): Promise<void> {
  const { HOST, PORT, LOG_LEVEL } = config();
  const server = createServer();
  const development = process.env.NODE_ENV === "development";
  const app = next({ dev: development, hostname: HOST, port: PORT, httpServer: server, quiet: true });
  await app.prepare();
  const handle = app.getRequestHandler();
  // In development Next.js serves all of it, so that every change shows.
  const mountedFor = development ? () => undefined : await mountCalculations();
  server.on("request", (request, response) => {
    const address = addressOf(request);
    void withCaller(address, () => (mountedFor(request) ?? handle)(request, response));
  });
  await listen(server, HOST, PORT);
  log().info({ host: HOST, port: PORT, level: LOG_LEVEL }, "listening");
  stopOnRequest(server);
  startHousekeeping();
  startWebhooks();
  process.send?.("ready");
}

function listen(server: Server, host: string, port: number): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once("error", reject);
    server.listen(port, host, resolve);
  });
}

/** Stops once, on a signal or when the parent that started this process is gone. */
function stopOnRequest(server: Server): void {
  let stopping = false;
  const stop = async (): Promise<void> => {
    if (stopping) return;
    stopping = true;
    const closed = new Promise<void>((resolve) => server.close(() => resolve()));
    server.closeIdleConnections();
    await Promise.race([closed, pause(STOP_TIMEOUT_MS, undefined, { ref: false })]);
    await runShutdownTasks((name, error) => log().error({ err: error, name }, "a task at shutdown failed"));
    log().info("stopped");
    process.exit(0);
  };
  process.on("SIGTERM", () => void stop());
  process.on("SIGINT", () => void stop());
  process.on("disconnect", () => void stop());
}

serve().catch((error: NodeJS.ErrnoException) => {
  const { HOST, PORT } = config();
  if (error.code === "EADDRINUSE") console.error(`Port ${PORT} on ${HOST} is taken. Stop what uses it, or choose another: PORT=3001 npm start`);
  else console.error(error);
  process.exit(1);
});
