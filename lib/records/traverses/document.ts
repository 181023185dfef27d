import type { RecordContext } from "../context";
import type { IssuedDocument } from "../issuedDocument";
import { findProject } from "../projects";
import { snapshotOf } from "./datedInstrument";
import { measurementOf } from "./measure";
import type { TraverseRow } from "./row";

/** The part of a document that follows from the traverse's own row, which can be compared with the row at any time. */
export type RowPart = Omit<IssuedDocument, "format" | "environment" | "organisation" | "project">;

export function rowPart(row: TraverseRow): RowPart {
  const { input, instrument_snapshot: instrument } = row;
  return {
    id: row.id,
    revision: row.revision,
    supersedes: row.supersedes_id,
    system: row.system,
    location: input.location ?? null,
    technician: input.technician!,
    takenAt: row.taken_at!.toISOString(),
    issuedAt: row.issued_at!.toISOString(),
    notes: input.notes ?? null,
    holes: { count: input.holes!.count, sealed: input.holes!.sealed, method: input.holes!.method ?? null },
    instrument: instrument && snapshotOf(instrument),
    calibrationWaiver: input.calibrationWaiver ?? null,
    measurement: measurementOf(input, instrument)!,
    result: row.result!,
    engineVersion: row.engine_version!,
  };
}

/** An issued traverse as it is signed. */
export async function documentOf(context: RecordContext, row: TraverseRow): Promise<IssuedDocument> {
  const project = await findProject(context, row.project_id);
  const { id, name } = (await context.db("organisations").where({ id: context.realm.organisationId }).first("id", "name")) as { id: string; name: string };
  return {
    format: "averduct/traverse/1",
    environment: context.realm.environment,
    organisation: { id, name },
    project: { id: project.id, name: project.name, number: project.number, location: project.location },
    ...rowPart(row),
  };
}
