import { NextResponse, type NextRequest } from "next/server";

/** The page that shows the API reference: its package writes styles and scripts into the page itself. */
const REFERENCE = "/docs/reference";

/**
 * Gives every page a content security policy with a fresh nonce, which Next.js puts on its own scripts.
 * It must not match the API: passing through here would cost a request a third of its speed.
 */
export function proxy(request: NextRequest): NextResponse {
  const nonce = btoa(crypto.randomUUID());
  const policy = policyFor(request.nextUrl.pathname, nonce);
  const headers = new Headers(request.headers);
  headers.set("Content-Security-Policy", policy);
  headers.set("x-nonce", nonce);
  headers.set("x-path", request.nextUrl.pathname + request.nextUrl.search);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set("Content-Security-Policy", policy);
  return response;
}

function policyFor(path: string, nonce: string): string {
  const development = process.env.NODE_ENV === "development" ? " 'unsafe-eval'" : "";
  const scripts = path === REFERENCE ? `'self' 'unsafe-inline'${development}` : `'self' 'nonce-${nonce}' 'strict-dynamic'${development}`;
  return [
    "default-src 'self'",
    `script-src ${scripts}`,
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' data: blob:",
    "font-src 'self'",
    "connect-src 'self'",
    "object-src 'none'",
    "base-uri 'self'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join("; ");
}

export const config = { matcher: ["/((?!api/|_next/|\\.well-known/|.*\\.(?:svg|png|ico|txt|woff2?)$).*)"] };
