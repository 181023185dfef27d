import type { IncomingMessage, ServerResponse } from "node:http";
import { pathToFileURL } from "node:url";
import path from "node:path";
import { toNodeHandler } from "srvx/node";
import { OPERATIONS } from "@/api-spec/registry";
import type { Handler } from "@/lib/http/operation";
import { ROOT } from "./packages.mjs";

type NodeHandler = (request: IncomingMessage, response: ServerResponse) => unknown;
const METHODS = new Set(["GET", "POST", "PUT", "PATCH", "DELETE"]);
const NO_PARAMS = { params: Promise.resolve({}) };

/**
 * The calculations, served beside Next.js: the very functions that their route files export, by path and method. On the
 * way through Next.js a request costs several times what the calculation does; everything else goes that way.
 */
export async function mountCalculations(): Promise<(request: IncomingMessage) => NodeHandler | undefined> {
  const mounted = new Map<string, Map<string, NodeHandler>>();
  for (const { scope, path: below } of OPERATIONS) {
    if (scope !== "calculations") continue;
    const file = path.join(ROOT, "app/api/v1", below, "route.ts");
    const route = (await import(pathToFileURL(file).href)) as Record<string, Handler>;
    const handlers = Object.entries(route).filter(([method]) => METHODS.has(method));
    mounted.set(`/api/v1${below}`, new Map(handlers.map(([method, handler]) => [method, toNodeHandler((request) => handler(request, NO_PARAMS)) as NodeHandler])));
  }
  return ({ url = "", method = "" }) => mounted.get(pathOf(url))?.get(method);
}

function pathOf(url: string): string {
  const query = url.indexOf("?");
  return query < 0 ? url : url.slice(0, query);
}
