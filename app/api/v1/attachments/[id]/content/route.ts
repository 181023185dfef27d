import { readAttachmentContent as definition } from "@/api-spec/records/attachments";
import { otherMethods } from "@/lib/http/otherMethods";
import { validate } from "@/lib/http/validation";
import { contentByLink } from "@/lib/records/attachments/content";
import { inlineDisposition } from "@/lib/records/attachments/fileName";
import { answering } from "../../answering";

/** What is opened may show itself and nothing else: no script, no request, no place in another page's origin. */
const POLICY = "sandbox; default-src 'none'";

export const GET = answering(definition, async (request, params) => {
  const { id } = validate(definition.params!, params, "path");
  const link = validate(definition.query!, Object.fromEntries(new URL(request.url).searchParams), "query");
  const { row, body } = await contentByLink(id, link);
  // Next.js answers HEAD with this too, and leaves the body as it is: unread, with its file open.
  if (request.method === "HEAD") await body.cancel();
  return new Response(request.method === "HEAD" ? null : (body as ReadableStream<Uint8Array>), {
    headers: {
      "Content-Type": row.media_type,
      "Content-Disposition": inlineDisposition(row.file_name),
      "Cache-Control": "private, max-age=300",
      "Content-Security-Policy": POLICY,
      "Referrer-Policy": "no-referrer",
    },
  });
});
export const { POST, PUT, PATCH, DELETE } = otherMethods("GET");
