import type { z } from "zod";
import type { traverseAnswer, traverseSummary } from "@/api-spec/records/traverseShapes";
import { airflow } from "@/lib/airflow/calculations/airflow";
import { ENGINE_VERSION } from "@/lib/airflow/version";
import { snapshotOf } from "./datedInstrument";
import { measurementOf } from "./measure";
import { missingForIssue } from "./readiness";
import type { TraverseInput, TraverseRow } from "./row";

export type Traverse = z.input<typeof traverseAnswer>;
export type TraverseSummary = z.input<typeof traverseSummary>;

const INPUT_FIELDS = [
  "location", "technician", "notes", "holes", "calibrationWaiver", "duct", "layout", "points", "enterFrom", "readings", "air", "standardAir", "probe", "site", "design",
  "uncertainty", "negativeReadings", "units",
] as const satisfies (keyof TraverseInput)[];

/** A traverse as the API answers with it. */
export function traverseOf(row: TraverseRow, { working = false } = {}): Traverse {
  const { input, result } = row;
  const sent = Object.fromEntries(INPUT_FIELDS.map((name) => [name, input[name] ?? null])) as Pick<Traverse, (typeof INPUT_FIELDS)[number]>;
  return {
    id: row.id,
    status: row.status,
    revision: row.revision,
    supersedes: row.supersedes_id,
    supersededBy: row.superseded_by_id,
    projectId: row.project_id,
    instrumentId: row.instrument_id,
    system: row.system,
    takenAt: row.taken_at?.toISOString() ?? null,
    ...sent,
    instrument: row.instrument_snapshot && snapshotOf(row.instrument_snapshot),
    result: result && (working ? result : withoutWorking(result)) as Traverse["result"],
    engineVersion: row.engine_version,
    newerEngine: newerEngine(row),
    missingForIssue: row.status === "draft" ? missingForIssue({ input, takenAt: row.taken_at, instrument: row.instrument_snapshot, result }) : [],
    issuedAt: row.issued_at?.toISOString() ?? null,
    voided: row.voided_at && { at: row.voided_at.toISOString(), reason: row.void_reason ?? "" },
    createdAt: row.created_at.toISOString(),
    updatedAt: row.updated_at.toISOString(),
  };
}

function withoutWorking<Result extends { working?: unknown }>({ working: _working, ...result }: Result): Omit<Result, "working"> {
  return result;
}

/** What today's engine would make of a record that an older one calculated, where that differs. */
function newerEngine({ input, instrument_snapshot, result, engine_version }: TraverseRow): Traverse["newerEngine"] {
  if (!result || engine_version === ENGINE_VERSION) return null;
  const measurement = measurementOf(input, instrument_snapshot);
  const now = measurement && airflow(measurement).airflow.actual;
  return now && now.value !== result.airflow.actual.value ? { version: ENGINE_VERSION, airflow: now } : null;
}

/** What lists show of what was measured and of the result, kept beside the whole of them. */
export type Summary = Pick<TraverseSummary, "location" | "technician" | "airflow" | "verdict">;

/** A row of a list: only what lists show is read of it. */
export interface SummaryRow extends Pick<TraverseRow, "id" | "status" | "revision" | "project_id" | "instrument_id" | "system" | "taken_at" | "taken_or_created_at" | "percent_of_design" | "outside_tolerance" | "created_at" | "updated_at"> {
  summary: Summary;
}

export const summaryOf = (row: SummaryRow): TraverseSummary => ({
  id: row.id,
  status: row.status,
  revision: row.revision,
  projectId: row.project_id,
  instrumentId: row.instrument_id,
  system: row.system,
  location: row.summary.location,
  technician: row.summary.technician,
  takenAt: row.taken_at?.toISOString() ?? null,
  airflow: row.summary.airflow,
  percentOfDesign: row.percent_of_design,
  outsideTolerance: row.outside_tolerance === null ? null : row.outside_tolerance === 1,
  verdict: row.summary.verdict,
  createdAt: row.created_at.toISOString(),
  updatedAt: row.updated_at.toISOString(),
});
