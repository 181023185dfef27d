import { SESSION_COOKIE, SESSION_DAYS } from "@/lib/accounts/session";
import { config } from "@/lib/runtime/config";
import { isLoopback } from "@/lib/runtime/loopback";

/** A cookie of a request; undefined where it has none of this name. */
export function cookieOf(request: Request, name: string): string | undefined {
  for (const part of (request.headers.get("cookie") ?? "").split(";")) {
    const [key, ...value] = part.trim().split("=");
    if (key === name) return value.join("=");
  }
  return undefined;
}

/** Out of reach of scripts and other sites; over plain HTTP only on this very machine. */
function attributes(): string {
  const { protocol, hostname } = new URL(config().AVERDUCT_URL);
  const secure = protocol === "https:" || !isLoopback(hostname);
  return `Path=/; HttpOnly; SameSite=Lax${secure ? "; Secure" : ""}`;
}

export const sessionCookie = (token: string): string => `${SESSION_COOKIE}=${token}; Max-Age=${SESSION_DAYS * 86_400}; ${attributes()}`;
export const clearedSessionCookie = (): string => `${SESSION_COOKIE}=; Max-Age=0; ${attributes()}`;
