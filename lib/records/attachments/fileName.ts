import type { AttachmentMediaType } from "@/api-spec/records/attachments";

const LONGEST = 200;
const ENDINGS: Record<AttachmentMediaType, string> = { "image/jpeg": "jpg", "image/png": "png", "application/pdf": "pdf" };
/** Control and format characters, the latter because some turn the direction of what follows; half characters. */
const UNSHOWN = /[\p{Cc}\p{Cf}\p{Cs}\p{Zl}\p{Zp}]/gu;

/** A file's name as it may be shown: without a path and anything that is not seen. It never says where a file is kept. */
export function displayName(sent: string, mediaType: AttachmentMediaType): string {
  const last = sent.normalize("NFC").split(/[\\/]/).at(-1)!;
  const name = [...last.replace(UNSHOWN, "").replace(/\s+/gu, " ").trim()].slice(0, LONGEST).join("");
  return /^\.*$/.test(name) ? `attachment.${ENDINGS[mediaType]}` : name;
}

/** The header that shows a file in the browser and names it where it is saved (RFC 6266, RFC 8187). */
export const inlineDisposition = (name: string): string => `inline; filename*=UTF-8''${encodeURIComponent(name).replace(/['()*]/g, (one) => `%${one.charCodeAt(0).toString(16).toUpperCase()}`)}`;
