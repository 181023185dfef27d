import { createHash } from "node:crypto";
import { setImmediate } from "node:timers/promises";
import type { z } from "zod";
import { MOST_FAULTS_TOLD, type importOptions } from "@/api-spec/records/imports";
import { traverseFields } from "@/api-spec/records/traverseShapes";
import { AirflowInputError } from "@/lib/airflow/errors";
import { Problem } from "@/lib/problems/problem";
import type { RecordContext } from "../context";
import { measure, type Measured } from "../traverses/measure";
import { referencesOf, type References } from "../traverses/references";
import type { TraverseInput } from "../traverses/row";
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
  if (projectId) await asParameter("projectId", references.requireProject(projectId));
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
  const { projectId, instrumentId = null, system: _s, takenAt, ...input } = parsed.data;
  told.readings = input.readings?.lines.flat().filter((reading) => reading !== null).length ?? 0;
  await tolerating(() => references.requireProject(projectId), candidate, add);
  const instrument = await tolerating(() => references.instrument(instrumentId, takenAt ? new Date(takenAt) : null), candidate, add);
  await tolerating(async () => Object.assign(told, outcomeOf(measure(input as TraverseInput, instrument ?? null))), candidate, add);
  return { told, fields: parsed.data };
}

function outcomeOf({ result, percent_of_design: percentOfDesign }: Measured): Partial<Told> {
  if (!result) return {};
  const failedChecks = result.checks.filter(({ passed }) => !passed).map(({ code, severity, detail }) => ({ code, severity, detail }));
  return { airflow: result.airflow.actual, percentOfDesign, verdict: result.design?.verdict ?? null, failedChecks };
}

/** Does something with a traverse; what is refused of it, is told of at its cell. */
async function tolerating<Result>(work: () => Promise<Result>, candidate: Candidate, tell: (fault: ImportFault) => void): Promise<Result | undefined> {
  try {
    return await work();
  } catch (error) {
    if (error instanceof AirflowInputError) for (const { path, code, detail } of error.faults) tell(faultAt(candidate, path, code, detail));
    else if (error instanceof Problem) for (const { pointer, code, detail } of error.details.errors ?? []) tell(faultAt(candidate, pointer.split("/").slice(1), code, detail));
    else throw error;
    return undefined;
  }
}

/** Says of a reference that it was named in the query. */
async function asParameter(parameter: string, looked: Promise<void>): Promise<void> {
  await looked.catch((error: unknown) => {
    if (!(error instanceof Problem)) throw error;
    throw new Problem(error.slug, { detail: error.message, errors: error.details.errors?.map((fault) => ({ ...fault, pointer: "", parameter })) });
  });
}
