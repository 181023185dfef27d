import { z } from "zod";
import { defineOperation } from "../define";
import { line, moment, recordId, traverseId } from "./common";

const TAG = "Attachments";
const MIB = 1024 ** 2;

export const MOST_ATTACHMENTS = 50;
export const LARGEST_FILE = 10 * MIB;
/** What a form has besides its file: names, types, boundaries, the caption. */
export const LARGEST_FORM = LARGEST_FILE + 64 * 1024;

export const attachmentMediaType = z.enum(["image/jpeg", "image/png", "application/pdf"]);
export type AttachmentMediaType = z.output<typeof attachmentMediaType>;

const attachmentId = recordId("att", "an attachment");
const ofTraverse = z.strictObject({ id: traverseId });
const one = z.strictObject({ id: traverseId, attachmentId });
const caption = line(500);

export const attachmentAnswer = z
  .strictObject({
    id: attachmentId,
    traverseId,
    fileName: z.string().describe("As it was sent, without a path; for display only."),
    caption: z.string().nullable(),
    mediaType: attachmentMediaType.describe("Told from the content."),
    bytes: z.int(),
    sha256: z.string().regex(/^[0-9a-f]{64}$/).describe("SHA-256 of the content, in hexadecimal."),
    createdAt: moment,
    url: z.url().describe("The content, for whoever has this link, until `urlExpiresAt`. No key is needed."),
    urlExpiresAt: moment.describe("Five minutes after the answer was made. Read the attachment again for a new link."),
  })
  .meta({ id: "Attachment", description: "A photograph or document of a traverse." });

/** The text fields of the form; the file is the one part that is no text. */
export const attachmentFormFields = z.strictObject({ caption: caption.optional() });
const attachmentForm = attachmentFormFields
  .extend({ file: z.string().meta({ format: "binary", description: "The file itself, with its name." }) })
  .meta({ id: "AttachmentForm", description: "A file to be attached." });

export const createAttachment = defineOperation({
  id: "createAttachment", method: "post", path: "/traverses/{id}/attachments", tag: TAG, scope: "records:write", status: 201,
  summary: "Attach a file to a draft",
  description: `Send a form (\`multipart/form-data\`) with the part \`file\`, and \`caption\` if you like (at most 500 characters). Taken are JPEG, PNG and PDF up to ${LARGEST_FILE / MIB} MiB, at most ${MOST_ATTACHMENTS} a traverse. What a file is, is told from its content, not from its name; one that is cut off, or has something after its end, is refused.`,
  params: ofTraverse,
  form: attachmentForm,
  answer: attachmentAnswer,
  maxBodyBytes: LARGEST_FORM,
  problems: ["not-found", "not-a-draft", "invalid-request", "unsupported-media-type", "body-too-large"],
});

export const listAttachments = defineOperation({
  id: "listAttachments", method: "get", path: "/traverses/{id}/attachments", tag: TAG, scope: "records:read",
  summary: "List a traverse's attachments",
  description: "All of them, the first first, each with a fresh link to its content.",
  params: ofTraverse,
  answer: z.strictObject({ items: z.array(attachmentAnswer) }),
  problems: ["not-found"],
});

export const readAttachment = defineOperation({
  id: "readAttachment", method: "get", path: "/traverses/{id}/attachments/{attachmentId}", tag: TAG, scope: "records:read",
  summary: "Read an attachment",
  description: "One attachment, with a fresh link to its content.",
  params: one,
  answer: attachmentAnswer,
  problems: ["not-found"],
});

export const changeAttachment = defineOperation({
  id: "changeAttachment", method: "patch", path: "/traverses/{id}/attachments/{attachmentId}", tag: TAG, scope: "records:write",
  summary: "Change an attachment's caption",
  description: "While the traverse is a draft.",
  params: one,
  body: z.strictObject({ caption: caption.nullable() }).partial().meta({ id: "AttachmentChange", description: "What is to change of an attachment." }),
  answer: attachmentAnswer,
  problems: ["not-found", "not-a-draft"],
});

export const deleteAttachment = defineOperation({
  id: "deleteAttachment", method: "delete", path: "/traverses/{id}/attachments/{attachmentId}", tag: TAG, scope: "records:write", status: 204,
  summary: "Delete an attachment",
  description: "While the traverse is a draft. What an issued record has, stays with it.",
  params: one,
  answer: z.null(),
  problems: ["not-found", "not-a-draft"],
});

export const readAttachmentContent = defineOperation({
  id: "readAttachmentContent", method: "get", path: "/attachments/{id}/content", tag: TAG, scope: null,
  summary: "Get an attachment's content",
  description: "The link in `url` of an attachment. It needs no key and works for five minutes, so that it can stand in a page.",
  params: z.strictObject({ id: attachmentId }),
  query: z.strictObject({
    expires: z.coerce.number().int().min(0).max(99_999_999_999).describe("Seconds since 1970 (Unix time) at which the link ends."),
    signature: z.string().max(100).describe("HMAC of the attachment and the end."),
  }),
  answer: z.string(),
  media: attachmentMediaType.options,
  problems: ["not-found", "link-not-valid", "temporarily-unavailable"],
});
