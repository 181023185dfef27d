import { newId } from "@/lib/ids/newId";
import type { RecordContext } from "./context";
import { addRecord, recordsOf } from "./realm";

export type HistoryAction =
  | "created" | "changed" | "issued" | "voided" | "superseded" | "revision_begun"
  | "attachment_added" | "attachment_changed" | "attachment_deleted";

/** Writes down what was done to a traverse, by whom, in the transaction that does it. */
export async function addHistory(context: RecordContext, traverseId: string, action: HistoryAction, details: Record<string, unknown> | null = null): Promise<void> {
  await addRecord(context.db, "traverse_history", context.realm, historyRow(context, traverseId, action, details));
}

/** The row of the same, for when many are written at once. */
export const historyRow = ({ by }: Pick<RecordContext, "by">, traverseId: string, action: HistoryAction, details: Record<string, unknown> | null = null) => ({
  id: newId("his"),
  traverse_id: traverseId,
  action,
  api_key_id: by.apiKeyId ?? null,
  user_id: by.userId ?? null,
  details: details && JSON.stringify(details),
  at: new Date(),
});

interface HistoryRow {
  id: string;
  action: HistoryAction;
  api_key_id: string | null;
  user_id: string | null;
  details: Record<string, unknown> | null;
  at: Date;
}

/** Everything that was done to a traverse, the first first. */
export async function historyOf({ db, realm }: Pick<RecordContext, "db" | "realm">, traverseId: string) {
  const rows = await recordsOf<HistoryRow>(db, "traverse_history", realm).where("traverse_id", traverseId).orderBy("id");
  return rows.map(({ id, action, api_key_id, user_id, details, at }) => ({ id, action, at: at.toISOString(), apiKeyId: api_key_id, userId: user_id, details }));
}
