import { type Problem, refusal } from "@/lib/problems/problem";

const MIB = 1024 ** 2;
export const DEFAULT_BODY_LIMIT = MIB;
const MOST_DISCARDED = 16 * MIB;

/** What an operation's definition says of its body. */
interface BodyDefinition {
  bodyMedia?: "text/csv";
  maxBodyBytes?: number;
}

/** The body of an operation: parsed JSON, or the text of a file. */
export const readBody = (request: Request, { bodyMedia, maxBodyBytes }: BodyDefinition): Promise<unknown> =>
  bodyMedia ? readFileText(request, bodyMedia, maxBodyBytes) : readJson(request, maxBodyBytes);

/** The request's body as parsed JSON. Throws the problem that says why it could not be read. */
export async function readJson(request: Request, maxBytes = DEFAULT_BODY_LIMIT): Promise<unknown> {
  requireType(request.headers.get("content-type"), "application/json");
  const text = await readText(request, maxBytes);
  try {
    return JSON.parse(text);
  } catch (error) {
    throw refusal("malformed-json", `The body is not JSON: ${error instanceof Error ? error.message : "it could not be parsed"}.`);
  }
}

function requireType(contentType: string | null, taken: string): void {
  const type = contentType?.split(";")[0]?.trim().toLowerCase();
  if (type === taken) return;
  throw refusal("unsupported-media-type", contentType ? `The body was sent as ${type}; send it as ${taken}.` : `The request has no Content-Type; send ${taken}.`, { header: "Content-Type" }, { Accept: taken });
}

/** The text of a file, in the encoding that its byte order mark or the content type says; UTF-8 where neither does. */
async function readFileText(request: Request, media: string, maxBytes = DEFAULT_BODY_LIMIT): Promise<string> {
  const contentType = request.headers.get("content-type");
  requireType(contentType, media);
  const bytes = await unlessCutOff(request, () => readUpTo(request, maxBytes));
  const charset = charsetOf(bytes) ?? /;\s*charset="?([^\s;"]+)/i.exec(contentType!)?.[1] ?? "utf-8";
  try {
    return new TextDecoder(charset, { fatal: true }).decode(bytes);
  } catch {
    throw refusal("invalid-request", `The file cannot be read as ${charset}. Save it as CSV in UTF-8, or say which encoding it is in: Content-Type: ${media}; charset=windows-1252.`, { code: "encoding_not_readable" });
  }
}

/** What a file's first bytes say of its encoding. The first character of a CSV file is ASCII, so a zero byte beside it is UTF-16. */
function charsetOf([first, second]: Uint8Array): string | undefined {
  if (first === 0xff && second === 0xfe) return "utf-16le";
  if (first === 0xfe && second === 0xff) return "utf-16be";
  if (first === 0xef && second === 0xbb) return "utf-8";
  if (second === 0) return "utf-16le";
  return first === 0 ? "utf-16be" : undefined;
}

function readText(request: Request, maxBytes: number): Promise<string> {
  const declared = request.headers.get("content-length");
  return unlessCutOff(request, async () => (declared !== null && Number(declared) <= maxBytes ? await request.text() : (await readUpTo(request, maxBytes)).toString("utf8")));
}

async function unlessCutOff<Content>(request: Request, read: () => Promise<Content>): Promise<Content> {
  try {
    return await read();
  } catch (error) {
    if (!request.signal.aborted) throw error;
    throw refusal("malformed-json", "The connection was closed before the whole body had come.", { code: "body_incomplete" });
  }
}

/** Reads a body of unknown length, or one declared too large, without ever holding more than the limit. */
async function readUpTo(request: Request, maxBytes: number): Promise<Buffer> {
  if (!request.body) return Buffer.alloc(0);
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
  return Buffer.concat(chunks);
}

function tooLarge(maxBytes: number): Problem {
  return refusal("body-too-large", `The body is larger than the ${maxBytes / MIB} MiB that this operation takes.`);
}
