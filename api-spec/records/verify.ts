import { z } from "zod";
import { defineOperation } from "../define";
import { moment, orNull, traverseId } from "./common";
import { traverseStatus } from "./traverseShapes";

export const verify = defineOperation({
  id: "verify", method: "post", path: "/verify", tag: "Verification", scope: null,
  summary: "Verify a signature",
  description:
    "Says whether a signature is ours and covers this very document, and what has become of the record since. Needs no key. " +
    "It can be checked without us as well: the key set is at `/.well-known/jwks.json`, and `examples/` has verifiers.",
  body: z.strictObject({
    jws: z.string().min(1).max(2_000_000).describe("A detached JWS with its document, or a compact one that carries it."),
    document: z.string().max(4_000_000).optional().describe("The canonical JSON, to the byte, for a detached JWS."),
  }),
  answer: z.strictObject({
    valid: z.boolean().describe("Whether one of our keys signed this very document."),
    reason: z.enum(["not_a_jws", "unknown_key", "signature_does_not_match"]).nullable().describe("Why not."),
    keyId: z.string().nullable(),
    record: orNull(
      z
        .strictObject({
          id: traverseId, status: traverseStatus, revision: z.int(), supersededBy: traverseId.nullable(),
          voided: z.strictObject({ at: moment, reason: z.string() }).nullable(), page: z.string().describe("Where it can be looked at."),
        })
        .meta({ id: "VerifiedRecord", description: "What has become of a signed record." }),
    ).describe("Null where the signature does not hold, or the record is not on this installation."),
  }),
  problems: ["burst-limit-reached"],
  maxBodyBytes: 6 * 1024 ** 2,
});
