import { createHmac, randomBytes } from "node:crypto";

const PREFIX = "whsec_";
const SECRET_BYTES = 32;

/** A new secret in the form that Standard Webhooks gives it. */
export const newSecret = (): string => PREFIX + randomBytes(SECRET_BYTES).toString("base64");

/**
 * The headers of a delivery as Standard Webhooks has them: one signature for each secret, separated by spaces.
 * @param id Of the message: the same at every attempt.
 * @param timestamp Of this attempt, in seconds since 1970.
 */
export function signatureHeaders(secrets: readonly string[], id: string, timestamp: number, body: string): Record<string, string> {
  const signatures = secrets.map((secret) => {
    const key = Buffer.from(secret.slice(PREFIX.length), "base64");
    return `v1,${createHmac("sha256", key).update(`${id}.${timestamp}.${body}`).digest("base64")}`;
  });
  return { "webhook-id": id, "webhook-timestamp": String(timestamp), "webhook-signature": signatures.join(" ") };
}
