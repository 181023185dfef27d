import { createHmac, timingSafeEqual } from "node:crypto";
import { Problem } from "@/lib/problems/problem";
import { config } from "@/lib/runtime/config";
import { derivedKey } from "@/lib/runtime/secretBox";

const LINK_SECONDS = 300;

const signatureOf = (id: string, expires: number): string => createHmac("sha256", derivedKey("attachment links")).update(`${id}\n${expires}`).digest("base64url");

/** A link to an attachment's content that works for a short time, for whoever has it. */
export function linkTo(id: string, now = Date.now()): { url: string; urlExpiresAt: string } {
  const expires = Math.floor(now / 1_000) + LINK_SECONDS;
  const query = new URLSearchParams({ expires: String(expires), signature: signatureOf(id, expires) });
  return { url: `${config().AVERDUCT_URL}/api/v1/attachments/${id}/content?${query}`, urlExpiresAt: new Date(expires * 1_000).toISOString() };
}

/** Throws the problem unless the link was made here, for this attachment, and has time left. */
export function requireLink(id: string, { expires, signature }: { expires: number; signature: string }, now = Date.now()): void {
  const [given, right] = [Buffer.from(signature), Buffer.from(signatureOf(id, expires))];
  if (given.length !== right.length || !timingSafeEqual(given, right)) throw notValid("signature", "The link is not as it was made.");
  if (expires * 1_000 <= now) throw notValid("expires", `The link ended at ${new Date(expires * 1_000).toISOString()}. Read the attachment again for a new one.`);
}

const notValid = (parameter: string, detail: string): Problem => new Problem("link-not-valid", { detail, errors: [{ pointer: "", parameter, code: "link_not_valid", detail }] });
