const ORIGIN = "http://averduct.invalid";

/**
 * A path to go on to that was asked for in an address, where it leads to a page of our own; otherwise the other one.
 * It is taken apart as a browser does, which drops tabs, turns backslashes and resolves dots before it looks for a host.
 */
export function ownPath(asked: unknown, otherwise: string): string {
  if (typeof asked !== "string" || !asked.startsWith("/") || !URL.canParse(asked, ORIGIN)) return otherwise;
  const { origin, pathname, search, hash } = new URL(asked, ORIGIN);
  return origin === ORIGIN && !pathname.startsWith("//") ? pathname + search + hash : otherwise;
}
