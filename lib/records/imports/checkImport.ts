import { createHash } from "node:crypto";
import { setImmediate } from "node:timers/promises";
import type { z } from "zod";
import { MOST_FAULTS_TOLD, type importOptions } from "@/api-spec/records/imports";
import { traverseFields } from "@/api-spec/records/traverseShapes";
import { AirflowInputError } from "@/lib/airflow/errors";
import { Problem } from "@/lib/problems/problem";
import type { RecordContext } from "../context";
import { projects } from "../projects";
import { datedInstrument, type DatedInstrument } from "../traverses/datedInstrument";
import { measure } from "../traverses/measure";
import { faultAt, type Candidate } from "./candidate";
import type { ImportFault, ImportReport } from "./fault";
import { fieldFaults } from "./fieldFaults";
import { readTraverses } from "./readTraverses";

export type ImportOptions = z.output<typeof importOptions>;
type TraverseFields = z.output<typeof traverseFields>;
type Reading = Pick<RecordContext, "db" | "realm">;

/** A file that was looked through: what is told of it, and the traverses that it comes to where nothing is at fault. */
export interface CheckedImport {
  report: ImportReport;
  traverses: TraverseFields[];
  /** The same for the same file with the same options. */
  sha256: Buffer;
}

/** After so long others are given a turn. */
const TURN_MS = 10;

/** Looks a whole file through and changes nothing. */
export async function checkImport(context: Reading, text: string, { mode, projectId, decimalComma, name }: ImportOptions): Promise<CheckedImport> {
  const references = referencesOf(context);
  if (projectId && !(await references.hasProject(projectId))) throw noSuchProject();
  const { traverses: candidates, form, delimiter, rows, faults } = await readTraverses(text, decimalComma);
  const report: ImportReport = { id: null, mode, repeated: false, name: name ?? null, form, delimiter, rows, traverses: [], faults, faultCount: 0, createdAt: null };
  const traverses: TraverseFields[] = [];
  let turn = performance.now();
  for (const candidate of candidates) {
    if (projectId) candidate.fields["projectId"] ??= projectId;
    const { told, fields } = await checkTraverse(candidate, references);
    report.traverses.push(told);
    if (fields) traverses.push(fields);
    faults.push(...candidate.faults);
    if (performance.now() - turn > TURN_MS) {
      await setImmediate();
      turn = performance.now();
    }
  }
  report.faultCount = faults.length;
  report.faults = faults.sort((one, other) => one.row - other.row).slice(0, MOST_FAULTS_TOLD);
  return { report, traverses, sha256: createHash("sha256").update(JSON.stringify([projectId ?? null, decimalComma])).update(text).digest() };
}

type Told = ImportReport["traverses"][number];

async function checkTraverse(candidate: Candidate, references: References): Promise<{ told: Told; fields?: TraverseFields }> {
  const { row, reference, fields: given } = candidate;
  const text = (value: unknown): string | null => (typeof value === "string" ? value : null);
  const told: Told = { row, reference, id: null, system: text(given["system"]), location: text(given["location"]), readings: 0, airflow: null, percentOfDesign: null, verdict: null, failedChecks: [] };
  const parsed = traverseFields.safeParse(given);
  const add = (fault: ImportFault): void => {
    // What a cell could not be read as, is missing from the fields as well; it is told of once.
    const told = fault.row === row && candidate.unread.has(fault.column ?? "");
    if (!told && !candidate.faults.some((known) => known.row === fault.row && known.column === fault.column)) candidate.faults.push(fault);
  };
  if (!parsed.success) {
    for (const { path, code, detail } of parsed.error.issues.flatMap((issue) => fieldFaults(issue, given))) add(faultAt(candidate, path, code, detail));
    return { told };
  }
  const { projectId, instrumentId, system: _s, takenAt, ...input } = parsed.data;
  told.readings = input.readings?.lines.flat().filter((reading) => reading !== null).length ?? 0;
  if (!(await references.hasProject(projectId))) add(faultAt(candidate, ["projectId"], "not_found", "There is no such project in this organisation and environment."));
  const instrument = instrumentId ? await references.instrument(instrumentId, takenAt ?? null) : null;
  if (instrumentId && !instrument) add(faultAt(candidate, ["instrumentId"], "not_found", "There is no such instrument in this organisation and environment."));
  try {
    const { result, percent_of_design: percentOfDesign } = measure(input as Parameters<typeof measure>[0], instrument);
    if (result) {
      const failedChecks = result.checks.filter(({ passed }) => !passed).map(({ code, severity, detail }) => ({ code, severity, detail }));
      Object.assign(told, { airflow: result.airflow.actual, percentOfDesign, verdict: result.design?.verdict ?? null, failedChecks });
    }
  } catch (error) {
    if (!(error instanceof AirflowInputError)) throw error;
    for (const { path, code, detail } of error.faults) add(faultAt(candidate, path, code, detail));
  }
  return { told, fields: parsed.data };
}

/** What the rows of a file refer to, each looked up once. */
interface References {
  hasProject(id: string): Promise<boolean>;
  /** The instrument as it was on the day, or null where there is none. */
  instrument(id: string, takenAt: string | null): Promise<DatedInstrument | null>;
}

function referencesOf(context: Reading): References {
  const once = <Value>(look: (key: string) => Promise<Value>) => {
    const known = new Map<string, Promise<Value>>();
    return (key: string): Promise<Value> => {
      const found = known.get(key) ?? look(key);
      known.set(key, found);
      return found;
    };
  };
  const hasProject = once(async (id) => (await projects(context).where("projects.id", id).first("projects.id")) !== undefined);
  const dated = once(async (key) => {
    const [id, day] = key.split(" ") as [string, string];
    try {
      return await datedInstrument(context, id, day ? new Date(day) : null);
    } catch (error) {
      if (error instanceof Problem) return null;
      throw error;
    }
  });
  return { hasProject, instrument: (id, takenAt) => dated(`${id} ${takenAt ? new Date(takenAt).toISOString().slice(0, 10) : ""}`) };
}

function noSuchProject(): Problem {
  const detail = "There is no such project in this organisation and environment.";
  return new Problem("invalid-request", { detail: `At projectId: ${detail}`, errors: [{ pointer: "", parameter: "projectId", code: "not_found", detail }] });
}
