import { z } from "zod";
import { defineOperation } from "../define";
import { instrumentId, line, moment, page, pageQuery, projectId, traverseId } from "./common";
import { traverseAnswer, traverseChange, traverseFields, traverseStatus, traverseSummary } from "./traverseShapes";

const TAG = "Traverses";
const params = z.strictObject({ id: traverseId });

export const traverseFilters = {
  projectId: projectId.optional(),
  status: traverseStatus.optional(),
  system: line(120).optional(),
  instrumentId: instrumentId.optional(),
  takenFrom: moment.optional().describe("Taken at this moment or later."),
  takenBefore: moment.optional().describe("Taken before this moment."),
  outsideTolerance: z.stringbool({ truthy: ["true"], falsy: ["false"] }).optional().describe("Only those whose airflow differs from design by more than the tolerance, or only the others."),
};
export const traversesQuery = z.strictObject({
  ...pageQuery,
  ...traverseFilters,
  sort: z.enum(["taken", "-taken", "created", "-created"]).default("-created").describe("By when it was taken (made, where that is not known) or made; with − the latest first."),
});

export const createTraverse = defineOperation({
  id: "createTraverse", method: "post", path: "/traverses", tag: TAG, scope: "records:write", status: 201, versioned: true,
  summary: "Store a traverse as a draft",
  description: "Only the project is needed at first; readings may come in as many sittings as it takes. As soon as there are a duct and readings, the result is there. Send an `Idempotency-Key` to be able to repeat the request safely.",
  body: traverseFields,
  answer: traverseAnswer,
  problems: ["impossible-input"],
});

export const listTraverses = defineOperation({
  id: "listTraverses", method: "get", path: "/traverses", tag: TAG, scope: "records:read",
  summary: "List traverses",
  description: "In the key's environment, filtered and sorted.",
  query: traversesQuery,
  answer: page(traverseSummary),
});

export const readTraverse = defineOperation({
  id: "readTraverse", method: "get", path: "/traverses/{id}", tag: TAG, scope: "records:read", versioned: true,
  summary: "Read a traverse",
  description: "One traverse with its result, and for a draft what it still needs before it can be issued.",
  params,
  query: z.strictObject({ include: z.literal("working").optional().describe("`working`: with each step of the result.") }),
  answer: traverseAnswer,
  problems: ["not-found"],
});

export const changeTraverse = defineOperation({
  id: "changeTraverse", method: "patch", path: "/traverses/{id}", tag: TAG, scope: "records:write", versioned: true,
  summary: "Change a draft",
  description: "Changes the fields that are sent and leaves the others; the result follows. Send the ETag you saw in `If-Match`, so that nobody's change is lost.",
  params,
  body: traverseChange,
  answer: traverseAnswer,
  problems: ["not-found", "not-a-draft", "precondition-failed", "impossible-input"],
});

export const deleteTraverse = defineOperation({
  id: "deleteTraverse", method: "delete", path: "/traverses/{id}", tag: TAG, scope: "records:write", status: 204, versioned: true,
  summary: "Delete a draft",
  description: "Deletes a draft with its attachments. What was issued stays; it can be voided.",
  params,
  answer: z.null(),
  problems: ["not-found", "not-a-draft", "precondition-failed"],
});

export const issueTraverse = defineOperation({
  id: "issueTraverse", method: "post", path: "/traverses/{id}/issue", tag: TAG, scope: "records:issue", versioned: true,
  summary: "Issue a traverse",
  description: "Makes the traverse read-only and signs it. It needs a result, who took it and when, its holes sealed, and an instrument in calibration on the day (or a waiver with a reason). Everything that is missing is listed at once.",
  params,
  answer: traverseAnswer,
  problems: ["not-found", "not-a-draft", "not-ready-to-issue", "precondition-failed"],
});

export const voidTraverse = defineOperation({
  id: "voidTraverse", method: "post", path: "/traverses/{id}/void", tag: TAG, scope: "records:issue", versioned: true,
  summary: "Void a record",
  description: "Withdraws an issued record. It stays readable, and says that it is void and why.",
  params,
  body: z.strictObject({ reason: line(1_000).describe("Shown on the record and where it is verified.") }),
  answer: traverseAnswer,
  problems: ["not-found", "not-issued", "precondition-failed"],
});

export const reviseTraverse = defineOperation({
  id: "reviseTraverse", method: "post", path: "/traverses/{id}/revisions", tag: TAG, scope: "records:issue", status: 201, versioned: true,
  summary: "Begin a revision",
  description: "Makes a draft with everything the record has. When it is issued, it supersedes the record, which stays readable and says so.",
  params,
  answer: traverseAnswer,
  problems: ["not-found", "not-issued", "revision-open"],
});

export const readHistory = defineOperation({
  id: "readHistory", method: "get", path: "/traverses/{id}/history", tag: TAG, scope: "records:read",
  summary: "Read a traverse's history",
  description: "Who did what to it, when, with which key.",
  params,
  answer: z.strictObject({
    items: z.array(
      z
        .strictObject({
          id: z.string(), action: z.string().describe("`created`, `changed`, `issued`, `voided`, `superseded`, `revision_begun`, `attachment_added`, `attachment_changed` or `attachment_deleted`."), at: moment,
          apiKeyId: z.string().nullable(), userId: z.string().nullable().describe("A person, where it was done in the portal."),
          details: z.record(z.string(), z.unknown()).nullable().describe("What was changed, and the like."),
        })
        .meta({ id: "HistoryEntry", description: "Something that was done to a traverse." }),
    ),
  }),
  problems: ["not-found"],
});

export const readSignature = defineOperation({
  id: "readSignature", method: "get", path: "/traverses/{id}/signature", tag: TAG, scope: "records:read",
  summary: "Read a record's signature",
  description: "The detached JWS (RFC 7515, appendix F) and the canonical JSON (RFC 8785) it covers. With the key set at `/.well-known/jwks.json` anyone can check it without us.",
  params,
  answer: z.strictObject({
    jws: z.string().describe("Detached JWS, EdDSA."),
    document: z.string().describe("The canonical JSON, to the byte: its UTF-8 is the payload."),
    keyId: z.string(),
    jwks: z.string().describe("Address of the key set."),
    verify: z.string().describe("Address of the page that shows the record to anyone."),
  }),
  problems: ["not-found", "not-issued"],
});

export const readFigure = defineOperation({
  id: "readFigure", method: "get", path: "/traverses/{id}/figure.svg", tag: TAG, scope: "records:read", media: "image/svg+xml",
  summary: "The figure of a traverse",
  description: "The cross-section to scale, with each reading where it was taken, coloured by velocity, suspected slips ringed. A draft without readings gives the plan of its duct.",
  params,
  query: z.strictObject({ size: z.enum(["page", "thumbnail"]).default("page").describe("`thumbnail`: as small as a stamp, for lists.") }),
  answer: z.string(),
  problems: ["not-found", "nothing-to-draw"],
});

export const readCertificate = defineOperation({
  id: "readCertificate", method: "get", path: "/traverses/{id}/certificate.pdf", tag: TAG, scope: "records:read", media: "application/pdf",
  summary: "The certificate of a record",
  description: "What was signed, as a PDF to file: duct, figure, conditions, instrument, readings, working, airflow with its uncertainty and verdict, checks, and a code that leads to the page where anyone can check it.",
  params,
  answer: z.string(),
  problems: ["not-found", "not-issued", "record-altered"],
});
