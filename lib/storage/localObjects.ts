import { randomUUID } from "node:crypto";
import { mkdir, open, readdir, rename, rm, stat, writeFile } from "node:fs/promises";
import path from "node:path";
import type { S3ClientConfig } from "@aws-sdk/client-s3";

/** What the SDK hands to its request handler and takes from it, as far as it matters here. */
interface SdkRequest {
  method: string;
  path: string;
  query?: Record<string, string | string[] | null | undefined>;
  body?: Uint8Array;
}

interface SdkResponse {
  statusCode: number;
  headers: Record<string, string>;
  body?: unknown;
}

/** Parts of letters, digits, _ and -: such a key can neither leave the folder nor be taken for an unfinished file. */
const KEY = /^[\w-]+(\/[\w-]+)*$/;
const MOST_LISTED = 1_000;

/**
 * A local fake of S3 for its own SDK: answers the requests the SDK makes from a folder, without a network. Several
 * processes may share the folder: a file appears whole, under its name, or not at all.
 */
export function localObjects(folder: string, bucket: string): NonNullable<S3ClientConfig["requestHandler"]> {
  return {
    handle: async (request: SdkRequest) => ({ response: await answer(folder, bucket, request) }),
    updateHttpClientConfig: () => undefined,
    httpHandlerConfigs: () => ({}),
  };
}

async function answer(folder: string, bucket: string, { method, path: asked, query = {}, body }: SdkRequest): Promise<SdkResponse> {
  const [, inBucket, ...parts] = asked.split("/");
  const key = parts.map(decodeURIComponent).join("/");
  if (inBucket !== bucket) return refusal(404, "NoSuchBucket");
  if (method === "GET" && key === "") return listed(folder, bucket, String(query["continuation-token"] ?? ""));
  if (!KEY.test(key)) return refusal(400, "InvalidArgument");
  const file = path.join(folder, key);
  if (method === "PUT") return put(file, body ?? new Uint8Array());
  if (method === "GET") return get(file);
  if (method === "DELETE") return remove(file);
  return refusal(405, "MethodNotAllowed");
}

async function put(file: string, body: Uint8Array): Promise<SdkResponse> {
  const unfinished = `${file}.${randomUUID()}.unfinished`;
  await mkdir(path.dirname(file), { recursive: true, mode: 0o700 });
  try {
    await writeFile(unfinished, body, { flush: true, mode: 0o600 });
    await rename(unfinished, file);
  } finally {
    await rm(unfinished, { force: true });
  }
  return { statusCode: 200, headers: {} };
}

async function get(file: string): Promise<SdkResponse> {
  try {
    const handle = await open(file);
    const { size, mtime } = await handle.stat();
    return { statusCode: 200, headers: { "content-length": String(size), "last-modified": mtime.toUTCString() }, body: handle.createReadStream() };
  } catch (error) {
    if (isMissing(error)) return refusal(404, "NoSuchKey");
    throw error;
  }
}

async function remove(file: string): Promise<SdkResponse> {
  await rm(file, { force: true });
  return { statusCode: 204, headers: {} };
}

/** A page of all objects, in the order of their keys; the last key of a page is where the next one goes on. */
async function listed(folder: string, bucket: string, after: string): Promise<SdkResponse> {
  const keys = (await namesIn(folder)).map((name) => name.split(path.sep).join("/")).filter((key) => KEY.test(key) && key > after).sort();
  const shown = keys.slice(0, MOST_LISTED);
  const contents = await Promise.all(shown.map((key) => contentsOf(folder, key)));
  const more = keys.length > shown.length ? `<NextContinuationToken>${shown.at(-1)}</NextContinuationToken>` : "";
  return xml(200, `<ListBucketResult><Name>${bucket}</Name><IsTruncated>${more !== ""}</IsTruncated>${more}${contents.join("")}</ListBucketResult>`);
}

async function namesIn(folder: string): Promise<string[]> {
  try {
    return await readdir(folder, { recursive: true });
  } catch (error) {
    if (isMissing(error)) return [];
    throw error;
  }
}

/** One object of a list; nothing for a folder, or for what was deleted while it was listed. */
async function contentsOf(folder: string, key: string): Promise<string> {
  const found = await stat(path.join(folder, key)).catch(() => null);
  return found?.isFile() ? `<Contents><Key>${key}</Key><LastModified>${found.mtime.toISOString()}</LastModified><Size>${found.size}</Size></Contents>` : "";
}

const isMissing = (error: unknown): boolean => (error as NodeJS.ErrnoException).code === "ENOENT";
const refusal = (status: number, code: string): SdkResponse => xml(status, `<Error><Code>${code}</Code><Message>${code}</Message></Error>`);
const xml = (statusCode: number, text: string): SdkResponse => ({
  statusCode, headers: { "content-type": "application/xml" }, body: Buffer.from(`<?xml version="1.0" encoding="UTF-8"?>${text}`),
});
