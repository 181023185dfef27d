import { readFile } from "node:fs/promises";
import path from "node:path";
import { z } from "zod";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalOperation } from "@/lib/http/portalOperation";

const params = z.strictObject({ name: z.enum(["row-per-traverse.csv", "row-per-reading.csv"]) });

/** A template to fill in: the very file that the examples have. */
export const GET = portalOperation({ access: "signed_in", params }, async ({ params: { name } }) => {
  const file = await readFile(path.join(process.cwd(), "examples/csv", name));
  return new Response(new Uint8Array(file), { headers: { "Content-Type": "text/csv; charset=utf-8; header=present", "Content-Disposition": `attachment; filename="${name}"` } });
});
export const { POST, PUT, PATCH, DELETE } = otherMethods("GET");
