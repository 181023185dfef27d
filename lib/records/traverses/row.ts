import type { z } from "zod";
import type { traverseFields } from "@/api-spec/records/traverseShapes";
import type { AirflowAnswer } from "@/lib/airflow/calculations/airflow";
import type { RecordContext } from "../context";
import { noSuchRecord } from "../noSuchRecord";
import { recordsOf } from "../realm";
import { refusal } from "@/lib/problems/problem";
import type { DatedInstrument } from "./datedInstrument";

/** What was sent of a traverse, without what was left out or cleared. */
export type TraverseInput = NonNullableFields<Omit<z.output<typeof traverseFields>, "projectId" | "instrumentId" | "system" | "takenAt">>;
type NonNullableFields<T> = { [Key in keyof T]?: NonNullable<T[Key]> };

export interface TraverseRow {
  id: string;
  version: number;
  status: "draft" | "issued" | "superseded" | "void";
  revision: number;
  project_id: string;
  instrument_id: string | null;
  supersedes_id: string | null;
  superseded_by_id: string | null;
  system: string | null;
  taken_at: Date | null;
  taken_or_created_at: Date;
  input: TraverseInput;
  result: AirflowAnswer | null;
  instrument_snapshot: DatedInstrument | null;
  engine_version: string | null;
  percent_of_design: number | null;
  outside_tolerance: number | null;
  issued_at: Date | null;
  voided_at: Date | null;
  void_reason: string | null;
  created_at: Date;
  updated_at: Date;
}

type Reading = Pick<RecordContext, "db" | "realm">;

export const traverses = ({ db, realm }: Reading) => recordsOf<TraverseRow>(db, "traverses", realm);

/** The row of a traverse, locked where it is to be changed. Throws the problem where there is none. */
export async function findTraverse(context: Reading, id: string, lock = false): Promise<TraverseRow> {
  const query = traverses(context).where("traverses.id", id);
  const row = await (lock ? query.forUpdate() : query).first();
  if (!row) throw noSuchRecord("traverse");
  return row;
}

/** The row of a draft, locked. Throws the problem where it was issued. */
export async function findDraft(context: Reading, id: string): Promise<TraverseRow> {
  const row = await findTraverse(context, id, true);
  if (row.status === "draft") return row;
  throw refusal("not-a-draft", `The traverse is ${row.status === "void" ? "void" : row.status}; only a draft can be changed.`);
}

/** The row of an issued record, locked. Throws the problem where it is in another state. */
export async function findIssued(context: Reading, id: string): Promise<TraverseRow> {
  const row = await findTraverse(context, id, true);
  if (row.status === "issued") return row;
  throw refusal("not-issued", row.status === "draft" ? "The traverse is a draft." : `The traverse is ${row.status}${row.superseded_by_id ? ` by ${row.superseded_by_id}` : ""}.`);
}
