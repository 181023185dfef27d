import type { z } from "zod";
import type { listImports as definition } from "@/api-spec/records/imports";
import type { RecordContext } from "../context";
import { noSuchRecord } from "../noSuchRecord";
import { pageOf, type Page, type PageRequest } from "../page";
import { recordsOf } from "../realm";
import type { ImportReport } from "./fault";

type Reading = Pick<RecordContext, "db" | "realm">;
export type ImportSummary = z.output<typeof definition.answer>["items"][number];

export interface ImportRow {
  id: string;
  name: string | null;
  sha256: Buffer | null;
  row_count: number;
  traverse_count: number;
  report: ImportReport;
  created_at: Date;
}

export const imports = ({ db, realm }: Reading) => recordsOf<ImportRow>(db, "imports", realm);

/** What was imported, the latest first. */
export async function listImports(context: Reading, page: PageRequest): Promise<Page<ImportSummary>> {
  const query = imports(context).select("imports.id", "name", "row_count", "traverse_count", "created_at") as unknown as ReturnType<typeof imports>;
  // An id begins with the time it was made.
  const { items, next } = await pageOf(query, "imports", { column: "imports.id", direction: "desc", valueOf: ({ id }: ImportRow) => id }, page);
  return { items: items.map(({ id, name, row_count, traverse_count, created_at }) => ({ id, name, rows: row_count, traverses: traverse_count, createdAt: created_at.toISOString() })), next };
}

/** What an import made, as it was answered. */
export async function readImport(context: Reading, id: string): Promise<ImportReport> {
  const row = await imports(context).where("imports.id", id).first("report");
  if (!row) throw noSuchRecord("import");
  return row.report;
}
