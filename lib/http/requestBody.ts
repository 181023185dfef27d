import { Problem } from "@/lib/problems/problem";

const MIB = 1024 ** 2;
export const DEFAULT_BODY_LIMIT = MIB;
const MOST_DISCARDED = 16 * MIB;

/** The request's body as parsed JSON. Throws the problem that says why it could not be read. */
export async function readJson(request: Request, maxBytes = DEFAULT_BODY_LIMIT): Promise<unknown> {
  requireJsonType(request.headers.get("content-type"));
  const text = await readText(request, maxBytes);
  try {
    return JSON.parse(text);
  } catch (error) {
    const detail = `The body is not JSON: ${error instanceof Error ? error.message : "it could not be parsed"}.`;
    throw new Problem("malformed-json", { detail, errors: [{ pointer: "", code: "malformed_json", detail }] });
  }
}

function requireJsonType(contentType: string | null): void {
  const type = contentType?.split(";")[0]?.trim().toLowerCase();
  if (type === "application/json") return;
  const detail = contentType ? `The body was sent as ${type}; send it as application/json.` : "The request has no Content-Type; send application/json.";
  throw new Problem("unsupported-media-type", {
    detail,
    errors: [{ pointer: "", header: "Content-Type", code: "unsupported_media_type", detail }],
    headers: { Accept: "application/json" },
  });
}

async function readText(request: Request, maxBytes: number): Promise<string> {
  const declared = request.headers.get("content-length");
  try {
    return declared !== null && Number(declared) <= maxBytes ? await request.text() : await readUpTo(request, maxBytes);
  } catch (error) {
    if (!request.signal.aborted) throw error;
    const detail = "The connection was closed before the whole body had come.";
    throw new Problem("malformed-json", { detail, errors: [{ pointer: "", code: "body_incomplete", detail }] });
  }
}

/** Reads a body of unknown length, or one declared too large, without ever holding more than the limit. */
async function readUpTo(request: Request, maxBytes: number): Promise<string> {
  if (!request.body) return "";
  const chunks: Uint8Array[] = [];
  let size = 0;
  const reader = request.body.getReader();
  for (let next = await reader.read(); !next.done; next = await reader.read()) {
    size += next.value.byteLength;
    if (size <= maxBytes) chunks.push(next.value);
    // A caller that is still sending would not read the answer, so a moderate excess is let run out.
    else if (size > maxBytes + MOST_DISCARDED) await reader.cancel();
  }
  if (size > maxBytes) throw tooLarge(maxBytes);
  return Buffer.concat(chunks).toString("utf8");
}

function tooLarge(maxBytes: number): Problem {
  const detail = `The body is larger than the ${maxBytes / MIB} MiB that this operation takes.`;
  return new Problem("body-too-large", { detail, errors: [{ pointer: "", code: "body_too_large", detail }] });
}
