import canonicalize from "canonicalize";

/** The canonical JSON of a value (RFC 8785): one text for one content, whoever writes it. */
export function canonicalJson(value: unknown): string {
  const text = canonicalize(value);
  if (text === undefined) throw new TypeError("only JSON has a canonical form");
  return text;
}
