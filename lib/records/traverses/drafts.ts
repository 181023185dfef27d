import type { z } from "zod";
import type { traverseChange, traverseFields } from "@/api-spec/records/traverseShapes";
import { newId } from "@/lib/ids/newId";
import type { RecordContext } from "../context";
import { addHistory, historyRow } from "../history";
import { deleteAttachmentsOf } from "../attachments/change";
import { deleteObjectsAfterCommit } from "../attachments/objects";
import { addRecord, recordsOf } from "../realm";
import type { DatedInstrument } from "./datedInstrument";
import { measure } from "./measure";
import { referencesOf, type References } from "./references";
import type { Summary } from "./answer";
import { findDraft, findTraverse, traverses, type TraverseInput, type TraverseRow } from "./row";

type Change = z.output<typeof traverseChange>;

/** Traverses to a statement. One with its working has some 20 kB; longer statements cost more in memory than they save. */
const AT_ONCE = 20;

/** Stores a traverse as a draft. */
export async function createTraverse(context: RecordContext, fields: z.output<typeof traverseFields>): Promise<TraverseRow> {
  const [id] = await createTraverses(context, [fields]);
  return findTraverse(context, id!);
}

/** Stores traverses as drafts; what they refer to is looked up once, and they are written many at once. Gives their ids, in the same order. */
export async function createTraverses(context: RecordContext, all: z.output<typeof traverseFields>[]): Promise<string[]> {
  const references = referencesOf(context);
  const ids: string[] = [];
  for (let from = 0; from < all.length; from += AT_ONCE) {
    const now = new Date();
    const rows = [];
    for (const fields of all.slice(from, from + AT_ONCE)) {
      const columns = await columnsWith(references, null, fields);
      rows.push({ id: newId("trv"), ...columns, taken_or_created_at: columns.taken_at ?? now, created_at: now, updated_at: now });
    }
    await addRecord(context.db, "traverses", context.realm, ...rows);
    await addRecord(context.db, "traverse_history", context.realm, ...rows.map(({ id }) => historyRow(context, id, "created")));
    ids.push(...rows.map(({ id }) => id));
  }
  return ids;
}

/** Changes the fields of a draft that are sent. @param requireMatch Throws unless the version is the one the caller saw. */
export async function changeTraverse(context: RecordContext, id: string, change: Change, requireMatch: (version: number) => void): Promise<TraverseRow> {
  const row = await findDraft(context, id);
  requireMatch(row.version);
  const columns = await columnsWith(referencesOf(context), row, change);
  await traverses(context)
    .where("traverses.id", id)
    .update({ ...columns, taken_or_created_at: columns.taken_at ?? row.created_at, version: row.version + 1, updated_at: new Date() } as never);
  await addHistory(context, id, "changed", { fields: Object.keys(change) });
  return findTraverse(context, id);
}

/** Deletes a draft and all that belongs to it. */
export async function deleteTraverse(context: RecordContext, id: string, requireMatch: (version: number) => void): Promise<void> {
  const row = await findDraft(context, id);
  requireMatch(row.version);
  deleteObjectsAfterCommit(context.db, await deleteAttachmentsOf(context.db, context.realm, id));
  await recordsOf(context.db, "traverse_history", context.realm).where("traverse_id", id).delete();
  await traverses(context).where("traverses.id", id).delete();
}

/** The columns of a draft as it was, with what is sent put in, and the result of it. */
async function columnsWith(references: References, before: TraverseRow | null, change: Change) {
  const { projectId = before?.project_id, instrumentId = before?.instrument_id ?? null, system = before?.system ?? null, takenAt, ...rest } = change;
  if (projectId !== before?.project_id) await references.requireProject(projectId!);
  const taken = takenAt === undefined ? (before?.taken_at ?? null) : takenAt === null ? null : new Date(takenAt);
  const input = withChange(before?.input ?? {}, rest);
  const instrument = await references.instrument(instrumentId, taken);
  return { project_id: projectId, instrument_id: instrumentId, system, taken_at: taken, ...measuredColumns(input, instrument) };
}

/** What is kept of what was measured: as it was sent, with the instrument of its day, and what it comes to. */
export function measuredColumns(input: TraverseInput, instrument: DatedInstrument | null) {
  const { result, ...measured } = measure(input, instrument);
  const summary: Summary = { location: input.location ?? null, technician: input.technician ?? null, airflow: result?.airflow.actual ?? null, verdict: result?.design?.verdict ?? null };
  return { input: JSON.stringify(input), summary: JSON.stringify(summary), instrument_snapshot: instrument && JSON.stringify(instrument), result: result && JSON.stringify(result), ...measured };
}

function withChange(before: TraverseInput, change: Record<string, unknown>): TraverseInput {
  const sent = Object.fromEntries(Object.entries(change).filter(([, value]) => value !== undefined));
  return Object.fromEntries(Object.entries({ ...before, ...sent }).filter(([, value]) => value !== null)) as TraverseInput;
}
