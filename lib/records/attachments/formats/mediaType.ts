import type { AttachmentMediaType } from "@/api-spec/records/attachments";
import { Problem, type ProblemFault } from "@/lib/problems/problem";
import type { Finding } from "./finding";
import { examineJpeg, isJpeg } from "./jpeg";
import { examinePdf, isPdf } from "./pdf";
import { examinePng, isPng } from "./png";

interface Format {
  mediaType: AttachmentMediaType;
  begins: (bytes: Buffer) => boolean;
  examine: (bytes: Buffer) => Finding;
}

const FORMATS: Format[] = [
  { mediaType: "image/jpeg", begins: isJpeg, examine: examineJpeg },
  { mediaType: "image/png", begins: isPng, examine: examinePng },
  { mediaType: "application/pdf", begins: isPdf, examine: examinePdf },
];

/** The type of a file by what is in it, whatever it was said to be. Throws the problem where it is not taken. */
export function mediaTypeOf(bytes: Buffer): AttachmentMediaType {
  const format = FORMATS.find(({ begins }) => begins(bytes));
  if (!format) throw new Problem("unsupported-media-type", atFile("file_type_not_taken", "The file is neither a JPEG nor a PNG nor a PDF, whatever its name and type say."));
  const finding = format.examine(bytes);
  if (finding) throw new Problem("invalid-request", atFile(finding.code, finding.detail));
  return format.mediaType;
}

function atFile(code: string, detail: string): { detail: string; errors: ProblemFault[] } {
  return { detail, errors: [{ pointer: "/file", code, detail }] };
}
