import { signedDocument } from "@/lib/records/verifyRecord";

/** What was signed and its signature, for whoever has the record's address. */
export async function GET(_request: Request, { params }: { params: Promise<{ id: string }> }): Promise<Response> {
  const { id } = await params;
  const signed = await signedDocument(id);
  return signed
    ? Response.json(signed, { headers: { "Content-Disposition": `attachment; filename="${id}.json"`, "X-Robots-Tag": "noindex" } })
    : Response.json({ detail: "There is no issued record with this id." }, { status: 404 });
}
