import type { Knex } from "knex";
import { database } from "@/db/connection";
import { inBackground } from "@/lib/runtime/background";
import { objectStore } from "@/lib/storage/objectStore";
import { recordsOf, type Realm } from "../realm";

const DAY_MS = 86_400_000;

/** Where an attachment's bytes are kept. Nothing that was sent goes into it. */
export const storageKey = ({ organisationId, environment }: Realm, attachmentId: string): string => `${organisationId}/${environment}/${attachmentId}`;

const KEY = /^(org_\w+)\/(sandbox|production)\/(att_\w+)$/;

/** Deletes bytes that no row refers to any more. One that could not be deleted is swept up later. */
export const deleteObjects = (keys: string[]): void => inBackground("delete objects", async () => {
  for (const key of keys) await objectStore().delete(key);
});

/** Deletes them once the transaction is committed; where it is undone, they stay. */
export function deleteObjectsAfterCommit(db: Knex, keys: string[]): void {
  if (!db.isTransaction) throw new TypeError("objects are deleted after a transaction");
  (db as Knex.Transaction).executionPromise.then(() => deleteObjects(keys), () => undefined);
}

/**
 * Deletes the bytes of attachments that have no row, as a process leaves them that ends within an upload or a deletion.
 * Young ones are left, since their row may be on its way, and those of organisations that are not on record here.
 */
export async function sweepObjects(now: number, store = objectStore()): Promise<string[]> {
  const deleted: string[] = [];
  for await (const { key, modifiedAt } of store.list()) {
    if (now - modifiedAt.getTime() < DAY_MS || !(await isOrphan(key))) continue;
    await store.delete(key);
    deleted.push(key);
  }
  return deleted;
}

async function isOrphan(key: string): Promise<boolean> {
  const [, organisationId, environment, id] = KEY.exec(key) ?? [];
  if (!organisationId || !environment || !id) return false;
  const realm = { organisationId, environment } as Realm;
  if (!(await database()("organisations").where("id", organisationId).first("id"))) return false;
  return !(await recordsOf(database(), "attachments", realm).where("attachments.id", id).first("attachments.id"));
}
