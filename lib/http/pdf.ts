/** A PDF answer, shown in the browser under a name of its own when it is kept. */
export const pdf = (bytes: Buffer, name: string): Response =>
  new Response(new Uint8Array(bytes), { headers: { "Content-Type": "application/pdf", "Content-Disposition": `inline; filename="${name}.pdf"`, "Cache-Control": "private, no-cache", "X-Content-Type-Options": "nosniff" } });
