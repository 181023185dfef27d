import { Problem, refusal } from "@/lib/problems/problem";
import { newId } from "@/lib/ids/newId";
import { canonicalJson } from "@/lib/signing/canonicalJson";
import { signDetached } from "@/lib/signing/detachedJws";
import { recordEvent } from "@/lib/webhooks/recordEvent";
import type { RecordContext } from "../context";
import { addHistory } from "../history";
import { addRecord } from "../realm";
import { datedInstrument } from "./datedInstrument";
import { documentOf } from "./document";
import { measuredColumns } from "./drafts";
import { measure } from "./measure";
import { missingForIssue } from "./readiness";
import { findDraft, findIssued, findTraverse, traverses, type TraverseRow } from "./row";

type Match = (version: number) => void;

/**
 * Issues a draft: calculates it with the instrument as it was on the day, signs it, and makes it read-only. The traverse
 * that it revises is superseded in the same transaction.
 * @param requireMatch Throws unless the version is the one the caller saw.
 */
export async function issueTraverse(context: RecordContext, id: string, requireMatch: Match): Promise<TraverseRow> {
  const row = await findDraft(context, id);
  requireMatch(row.version);
  const instrument = await datedInstrument(context, row.instrument_id, row.taken_at);
  const { result } = measure(row.input, instrument);
  requireReady(missingForIssue({ input: row.input, takenAt: row.taken_at, instrument, result }));
  const issuedAt = new Date();
  const columns = measuredColumns(row.input, instrument);
  await traverses(context).where("traverses.id", id).update({ ...columns, status: "issued", issued_at: issuedAt, version: row.version + 1, updated_at: issuedAt } as never);
  const issued = await findTraverse(context, id);
  const document = canonicalJson(await documentOf(context, issued));
  const { jws, keyId } = await signDetached(document, context.db);
  await context.db("issued_documents").insert({ traverse_id: id, document, signature: jws, signing_key_id: keyId, issued_at: issuedAt });
  await addHistory(context, id, "issued");
  if (row.supersedes_id) await supersede(context, row.supersedes_id, id);
  await recordEvent(context.db, context.realm, "traverse.issued", { id, projectId: issued.project_id, revision: issued.revision, supersedes: issued.supersedes_id, issuedAt: issuedAt.toISOString() });
  return issued;
}

function requireReady(missing: ReturnType<typeof missingForIssue>): void {
  if (missing.length === 0) return;
  throw new Problem("not-ready-to-issue", { detail: missing.map(({ detail }) => detail).join(" "), errors: missing });
}

async function supersede(context: RecordContext, oldId: string, newId: string): Promise<void> {
  const old = await findTraverse(context, oldId, true);
  // A record that was voided while its revision was being made stays void.
  if (old.status !== "issued") return;
  await traverses(context).where("traverses.id", oldId).update({ status: "superseded", superseded_by_id: newId, version: old.version + 1, updated_at: new Date() });
  await addHistory(context, oldId, "superseded", { by: newId });
}

/** Withdraws an issued record, with the reason that everyone who looks at it is told. */
export async function voidTraverse(context: RecordContext, id: string, reason: string, requireMatch: Match): Promise<TraverseRow> {
  const row = await findIssued(context, id);
  requireMatch(row.version);
  const now = new Date();
  await traverses(context).where("traverses.id", id).update({ status: "void", voided_at: now, void_reason: reason, version: row.version + 1, updated_at: now });
  await addHistory(context, id, "voided", { reason });
  await recordEvent(context.db, context.realm, "traverse.voided", { id, projectId: row.project_id, revision: row.revision, reason, voidedAt: now.toISOString() });
  return findTraverse(context, id);
}

/** Begins a revision: a draft with everything that the record has, which supersedes it once it is issued. */
export async function reviseTraverse(context: RecordContext, id: string, requireMatch: Match): Promise<TraverseRow> {
  const row = await findIssued(context, id);
  requireMatch(row.version);
  const draft = await traverses(context).where("supersedes_id", id).where("traverses.status", "draft").first("traverses.id");
  if (draft) {
    throw refusal("revision-open", `The draft ${draft.id} is to supersede this record.`);
  }
  const revisionId = newId("trv");
  const now = new Date();
  const instrument = await datedInstrument(context, row.instrument_id, row.taken_at);
  await addRecord(context.db, "traverses", context.realm, {
    id: revisionId, project_id: row.project_id, instrument_id: row.instrument_id, supersedes_id: id, revision: row.revision + 1, system: row.system, taken_at: row.taken_at,
    ...measuredColumns(row.input, instrument), taken_or_created_at: row.taken_at ?? now, created_at: now, updated_at: now,
  });
  await addHistory(context, id, "revision_begun", { revision: revisionId });
  await addHistory(context, revisionId, "created", { revises: id });
  return findTraverse(context, revisionId);
}
