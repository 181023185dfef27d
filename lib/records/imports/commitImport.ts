import { newId } from "@/lib/ids/newId";
import { Problem } from "@/lib/problems/problem";
import type { RecordContext } from "../context";
import { addRecord, recordsOf } from "../realm";
import { createTraverses } from "../traverses/drafts";
import { traverses } from "../traverses/row";
import type { CheckedImport } from "./checkImport";
import type { ImportReport } from "./fault";
import { imports, type ImportRow } from "./listImports";

/** Makes a draft of every traverse of a file that has no fault, in the transaction it is given; a file that was imported before, gives what it gave then. */
export async function commitImport(context: RecordContext, checked: CheckedImport): Promise<ImportReport> {
  const before = await importedBefore(context, checked.sha256);
  if (before) return { ...before, repeated: true };
  if (checked.report.faultCount > 0) throw hasFaults(checked.report);
  const id = newId("imp");
  const createdAt = new Date();
  const { rows, name } = checked.report;
  try {
    await addRecord(context.db, "imports", context.realm, { id, name, sha256: checked.sha256, row_count: rows, traverse_count: checked.traverses.length, report: "{}", created_at: createdAt });
  } catch (error) {
    // Another transaction has imported it while this one waited for the row.
    const meanwhile = (error as { code?: string }).code === "ER_DUP_ENTRY" && (await importedBefore(context, checked.sha256));
    if (meanwhile) return { ...meanwhile, repeated: true };
    throw error;
  }
  const report: ImportReport = { ...checked.report, id, mode: "commit", createdAt: createdAt.toISOString() };
  const ids = await createTraverses(context, checked.traverses);
  report.traverses = checked.report.traverses.map((traverse, index) => ({ ...traverse, id: ids[index]! }));
  await recordsOf(context.db, "imports", context.realm).where("imports.id", id).update({ report: JSON.stringify(report) });
  return report;
}

/** What the same file gave before, as long as any of its traverses is there; where none is, the file may be imported anew. */
async function importedBefore(context: RecordContext, sha256: Buffer): Promise<ImportReport | null> {
  const row = await imports(context).where({ sha256 }).first<Pick<ImportRow, "id" | "report"> | undefined>("imports.id", "report");
  if (!row) return null;
  const ids = row.report.traverses.map(({ id }) => id!);
  if (await traverses(context).whereIn("traverses.id", ids).first("traverses.id")) return row.report;
  await imports(context).where("imports.id", row.id).update({ sha256: null });
  return null;
}

function hasFaults({ faults, faultCount }: ImportReport): Problem {
  const [first] = faults;
  const place = first ? `Row ${first.row}${first.column ? `, column ${first.column}` : ""}: ${first.detail}` : "";
  const more = faultCount > 1 ? ` There ${faultCount === 2 ? "is one more fault" : `are ${faultCount - 1} more faults`}.` : "";
  return new Problem("import-has-faults", { detail: place + more, errors: faults.map((fault) => ({ pointer: "", ...fault })) });
}
