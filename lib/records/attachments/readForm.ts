import { LARGEST_FORM } from "@/api-spec/records/attachments";
import { type Problem, refusal } from "@/lib/problems/problem";
import { AttachmentFormReader, type FormContent } from "./form";

const MIB = 1024 ** 2;
const FORM = "multipart/form-data";
/** A caller that is still sending would not read the answer, so a moderate excess is let run out. */
const MOST_DISCARDED = 16 * MIB;

/** The form in a request's body, never more of it than the limit. Throws the problem that says why it cannot be had. */
export async function readForm(request: Request): Promise<FormContent> {
  const contentType = request.headers.get("content-type") ?? "";
  if (contentType.split(";")[0]?.trim().toLowerCase() !== FORM) throw wrongType(contentType);
  const declared = request.headers.get("content-length");
  const form = new AttachmentFormReader(contentType, declared === null ? null : Number(declared));
  try {
    await feed(request, form);
  } catch (error) {
    if (!request.signal.aborted) throw error;
    throw refusal("invalid-request", "The connection was closed before the whole form had come.", { code: "body_incomplete" });
  }
  return form.end();
}

async function feed(request: Request, form: AttachmentFormReader): Promise<void> {
  const reader = request.body?.getReader();
  if (!reader) return;
  let size = 0;
  for (let next = await reader.read(); !next.done; next = await reader.read()) {
    size += next.value.byteLength;
    if (size <= LARGEST_FORM) await form.write(next.value);
    else if (size > LARGEST_FORM + MOST_DISCARDED) await reader.cancel();
  }
  if (size > LARGEST_FORM) throw tooLarge();
}

function wrongType(contentType: string): Problem {
  return refusal("unsupported-media-type", contentType ? `The body was sent as ${contentType.split(";")[0]}; send a form as ${FORM}.` : `The request has no Content-Type; send a form as ${FORM}.`, { header: "Content-Type" }, { Accept: FORM });
}

function tooLarge(): Problem {
  return refusal("body-too-large", `The form is larger than the ${Math.floor(LARGEST_FORM / MIB)} MiB that this operation takes.`);
}
