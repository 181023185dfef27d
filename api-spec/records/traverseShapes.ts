import { z } from "zod";
import { airflow as airflowOperation } from "../calculations/airflow";
import { air, design, duct, layoutRule, negativeReadings, probe, readings, site, standardAirName, uncertaintyOptions, unitSystem } from "../calculations/shapes";
import { face, planPoints } from "../calculations/traversePlan";
import { airflow } from "../quantities";
import { calibrationId, day, instrumentId, line, moment, orNull, projectId, times, traverseId } from "./common";

/** The shapes of stored traverses. */

export const traverseStatus = z
  .enum(["draft", "issued", "superseded", "void"])
  .meta({ id: "TraverseStatus", description: "`draft` can be changed; `issued` is signed and stays; `superseded` was replaced by an issued revision; `void` was withdrawn." });

const holes = z
  .strictObject({
    count: z.int().min(0).max(1_000),
    sealed: z.boolean().describe("Whether all of them were sealed."),
    method: line(200).nullish().describe("With what: a plug, or a tape listed for the duct's material."),
  })
  .meta({ id: "Holes", description: "The holes drilled for the traverse." });

const waiver = z.strictObject({ reason: line(1_000) }).meta({ id: "CalibrationWaiver", description: "Why the traverse may be issued though no instrument was in calibration." });

/** What a traverse is: everything but the project may come later, as long as it is a draft. */
const measured = {
  instrumentId: instrumentId.nullish(),
  system: line(120).nullish().describe("The air system, e.g. AHU-1."),
  location: line(300).nullish().describe("Where on the system the plane lies."),
  technician: line(160).nullish().describe("Who took it."),
  takenAt: moment.nullish(),
  notes: z.string().trim().max(4_000).nullish(),
  holes: orNull(holes).optional(),
  calibrationWaiver: orNull(waiver).optional(),
  duct: orNull(duct).optional(),
  layout: orNull(layoutRule).optional(),
  points: orNull(planPoints).optional(),
  enterFrom: orNull(face).optional(),
  readings: orNull(readings).optional(),
  air: orNull(air).optional(),
  standardAir: orNull(standardAirName).optional(),
  probe: orNull(probe).optional().describe("The instrument's own where it is left out."),
  site: orNull(site).optional(),
  design: orNull(design).optional(),
  uncertainty: orNull(uncertaintyOptions).optional(),
  negativeReadings: negativeReadings.nullish(),
  units: orNull(unitSystem).optional(),
};

export const traverseFields = z.strictObject({ projectId, ...measured }).meta({ id: "TraverseFields", description: "A traverse to be stored as a draft. Only the project is needed at first." });
export const traverseChange = traverseFields.partial().meta({ id: "TraverseChange", description: "What is to change of a draft: each field that is sent replaces what was there; null clears it." });

const snapshot = z
  .strictObject({
    id: instrumentId, name: z.string(), manufacturer: z.string().nullable(), model: z.string().nullable(), serialNumber: z.string().nullable(),
    calibration: z
      .strictObject({ id: calibrationId, calibratedOn: day, dueOn: day, laboratory: z.string().nullable(), certificateNumber: z.string().nullable() })
      .nullable()
      .describe("The one in force on the day; null where there was none."),
  })
  .meta({ id: "InstrumentSnapshot", description: "The instrument as it was on the day the traverse was taken." });

const missing = z.strictObject({ pointer: z.string().describe("Place in the traverse."), code: z.string(), detail: z.string() });

export const traverseAnswer = z
  .strictObject({
    id: traverseId,
    status: traverseStatus,
    revision: z.int().describe("1, and one more for each revision."),
    supersedes: traverseId.nullable(),
    supersededBy: traverseId.nullable(),
    ...z.strictObject(measured).required().shape,
    projectId,
    instrument: orNull(snapshot),
    result: orNull(airflowOperation.answer).describe("What the `airflow` calculation makes of it; null while duct or readings are missing. Its working comes with `?include=working`."),
    engineVersion: z.string().nullable().describe("Version of the engine that made the result. A stored result is never changed by a later one."),
    newerEngine: z
      .strictObject({ version: z.string(), airflow })
      .nullable()
      .describe("Where today's engine would give another airflow: what it would be."),
    missingForIssue: z.array(missing).describe("What a draft still needs before it can be issued."),
    issuedAt: moment.nullable(),
    voided: z.strictObject({ at: moment, reason: z.string() }).nullable(),
    ...times,
  })
  .meta({ id: "Traverse", description: "A stored traverse." });

export const traverseSummary = z
  .strictObject({
    id: traverseId, status: traverseStatus, revision: z.int(), projectId, instrumentId: instrumentId.nullable(), system: z.string().nullable(), location: z.string().nullable(),
    technician: z.string().nullable(), takenAt: moment.nullable(), airflow: orNull(airflow).describe("Actual airflow."), percentOfDesign: z.number().nullable(),
    outsideTolerance: z.boolean().nullable(), verdict: z.enum(["within", "outside", "undecided"]).nullable(), ...times,
  })
  .meta({ id: "TraverseSummary", description: "A traverse in a list." });
