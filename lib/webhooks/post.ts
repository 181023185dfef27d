import { request as httpRequest } from "node:http";
import { request as httpsRequest } from "node:https";
import type { IncomingMessage } from "node:http";
import type { LookupFunction } from "node:net";
import { checkTarget, publicLookup, type TargetPolicy } from "./targets";

const TIMEOUT_MS = 10_000;
/** Of an answer's body nothing is used; this much is read, so that a receiver can finish what it says. */
const MOST_BODY_BYTES = 4_096;
const MOST_ERROR_CHARACTERS = 300;

/** What came of an attempt. */
export interface Outcome {
  /** HTTP status; null where there was no answer. */
  status: number | null;
  error: string | null;
  milliseconds: number;
}

export interface Message {
  url: string;
  headers: Record<string, string>;
  body: string;
}

/** Posts a message once. Redirects are answers like any other. Never throws: what went wrong is in the outcome. */
export async function post({ url, headers, body }: Message, policy: TargetPolicy, lookup: LookupFunction = publicLookup()): Promise<Outcome> {
  const start = performance.now();
  const outcome = (status: number | null, error: string | null): Outcome => ({ status, error, milliseconds: Math.round(performance.now() - start) });
  const signal = AbortSignal.timeout(TIMEOUT_MS);
  try {
    checkTarget(url, policy);
    const answer = await begin(url, { ...headers, "content-type": "application/json", "user-agent": "Averduct-Webhooks/1" }, body, signal, policy === "public" ? lookup : undefined);
    await discard(answer);
    return outcome(answer.statusCode!, null);
  } catch (error) {
    return outcome(null, signal.aborted ? `No answer within ${TIMEOUT_MS / 1_000} seconds.` : reasonOf(error));
  }
}

/** Sends the request and gives the answer once its status is there. Each request has a connection of its own. */
const begin = (url: string, headers: Record<string, string>, body: string, signal: AbortSignal, lookup: LookupFunction | undefined): Promise<IncomingMessage> =>
  new Promise((resolve, reject) => {
    const send = url.startsWith("https:") ? httpsRequest : httpRequest;
    const sent = send(url, { method: "POST", agent: false, headers: { ...headers, "content-length": Buffer.byteLength(body) }, signal, ...(lookup && { lookup }) }, resolve);
    sent.on("error", reject);
    sent.end(body);
  });

async function discard(answer: IncomingMessage): Promise<void> {
  let bytes = 0;
  try {
    for await (const chunk of answer) {
      bytes += (chunk as Buffer).length;
      if (bytes > MOST_BODY_BYTES) break;
    }
  } catch {
    // The status was there, and it alone counts: a body that breaks off, or goes on for too long, changes nothing.
  }
}

function reasonOf(error: unknown): string {
  const { message, code, errors } = error as NodeJS.ErrnoException & { errors?: Error[] };
  // A failure to connect to each of several addresses has no words of its own.
  return (message || errors?.[0]?.message || code || "The request failed.").slice(0, MOST_ERROR_CHARACTERS);
}
