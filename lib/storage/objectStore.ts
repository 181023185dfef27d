import type { ReadableStream } from "node:stream/web";
import { DeleteObjectCommand, GetObjectCommand, NoSuchKey, paginateListObjectsV2, PutObjectCommand, S3Client, type S3ClientConfig } from "@aws-sdk/client-s3";
import { Problem } from "@/lib/problems/problem";
import { config, type Config } from "@/lib/runtime/config";
import { log } from "@/lib/runtime/log";
import { processWide } from "@/lib/runtime/processWide";
import { localObjects } from "./localObjects";

export interface StoredObject {
  key: string;
  modifiedAt: Date;
}

/** Where the bytes of files are kept. Keys are made by the application, never from anything that was sent. */
export interface ObjectStore {
  put(key: string, bytes: Uint8Array, mediaType: string): Promise<void>;
  /** Throws NoSuchObject where there is none. */
  get(key: string): Promise<{ body: ReadableStream<Uint8Array>; bytes: number }>;
  /** Does nothing where there is none. */
  delete(key: string): Promise<void>;
  list(): AsyncIterable<StoredObject>;
}

export class NoSuchObject extends Error {}

const LOCAL_BUCKET = "local";
/** A service that does not answer is given up on; the SDK by itself would wait without end. */
const PATIENCE = { connectionTimeout: 5_000, requestTimeout: 30_000, throwOnRequestTimeout: true };

/** The installation's object store: S3 where a bucket is configured, otherwise a folder that the SDK takes for S3. */
export const objectStore = (): ObjectStore => processWide("objectStore", () => openObjectStore(config()));

export function openObjectStore(settings: Config): ObjectStore {
  // Announces which Node.js later versions of the SDK will need; the version here is fixed, and takes this one.
  process.env["AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED"] ??= "true";
  const client = new S3Client(clientSettings(settings));
  const Bucket = settings.S3_BUCKET ?? LOCAL_BUCKET;
  return {
    async put(Key, bytes, mediaType) {
      await answered(client.send(new PutObjectCommand({ Bucket, Key, Body: bytes, ContentType: mediaType, ContentLength: bytes.byteLength })));
    },
    async get(Key) {
      const { Body, ContentLength } = await answered(client.send(new GetObjectCommand({ Bucket, Key })));
      if (!Body || ContentLength === undefined) throw new NoSuchObject(Key);
      return { body: Body.transformToWebStream() as ReadableStream<Uint8Array>, bytes: ContentLength };
    },
    async delete(Key) {
      await answered(client.send(new DeleteObjectCommand({ Bucket, Key })));
    },
    async *list() {
      for await (const { Contents = [] } of paginateListObjectsV2({ client }, { Bucket })) {
        for (const { Key, LastModified } of Contents) if (Key && LastModified) yield { key: Key, modifiedAt: LastModified };
      }
    },
  };
}

function clientSettings({ S3_BUCKET, S3_REGION, S3_ENDPOINT, S3_ACCESS_KEY_ID, S3_SECRET_ACCESS_KEY, OBJECTS_FOLDER }: Config): S3ClientConfig {
  if (S3_BUCKET === undefined) {
    return {
      region: S3_REGION,
      endpoint: "http://objects.invalid",
      forcePathStyle: true,
      credentials: { accessKeyId: "local", secretAccessKey: "local" },
      requestHandler: localObjects(OBJECTS_FOLDER, LOCAL_BUCKET),
    };
  }
  return {
    region: S3_REGION,
    requestHandler: PATIENCE,
    ...(S3_ENDPOINT && { endpoint: S3_ENDPOINT, forcePathStyle: true }),
    ...(S3_ACCESS_KEY_ID && S3_SECRET_ACCESS_KEY && { credentials: { accessKeyId: S3_ACCESS_KEY_ID, secretAccessKey: S3_SECRET_ACCESS_KEY } }),
  };
}

async function answered<Answer>(request: Promise<Answer>): Promise<Answer> {
  try {
    return await request;
  } catch (error) {
    if (error instanceof NoSuchKey) throw new NoSuchObject(error.message, { cause: error });
    log().error({ err: error }, "the object store does not do what it was asked");
    throw new Problem("temporarily-unavailable", { detail: "The store that keeps files does not answer. Nothing was stored; repeat the request.", headers: { "Retry-After": "5" } });
  }
}
