import { refusal } from "@/lib/problems/problem";

const SAFE_METHODS = new Set(["GET", "HEAD", "OPTIONS"]);

/** Throws where a request that changes something comes from a page of another site. */
export function requireSameOrigin(request: Request): void {
  if (SAFE_METHODS.has(request.method)) return;
  const site = request.headers.get("sec-fetch-site");
  const origin = request.headers.get("origin");
  const host = request.headers.get("host");
  const fromOurPages = origin === null ? site === null || site === "same-origin" : hostOf(origin) === host && (site === null || site === "same-origin");
  if (fromOurPages) return;
  throw refusal("forbidden-origin", "Changes are taken from the portal's own pages only.", { header: "Origin" });
}

function hostOf(origin: string): string | null {
  try {
    return new URL(origin).host;
  } catch {
    return null;
  }
}
