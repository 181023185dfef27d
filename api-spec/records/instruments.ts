import { z } from "zod";
import { instrument as instrumentShape, probe } from "../calculations/shapes";
import { defineOperation } from "../define";
import { pressure, velocity } from "../quantities";
import { calibrationId, day, instrumentId, line, moment, orNull, page, pageQuery, times } from "./common";

const TAG = "Instruments";
const { principle, assumedDensity, accuracy } = instrumentShape.shape;
const params = z.strictObject({ id: instrumentId });

export const instrumentFields = z
  .strictObject({
    name: line(160).describe("What the firm calls it."),
    manufacturer: line(120).nullish(),
    model: line(120).nullish(),
    serialNumber: line(120).nullish(),
    principle,
    assumedDensity,
    accuracy,
    probe: probe.optional().describe("The probe that goes with it; a traverse may name another."),
    notes: z.string().trim().max(4_000).nullish(),
  })
  .meta({ id: "InstrumentFields", description: "An instrument to be made." });
export const instrumentChange = instrumentFields
  .partial()
  .extend({ assumedDensity: orNull(assumedDensity.unwrap()).optional(), accuracy: accuracy.nullable(), probe: orNull(probe).optional() })
  .meta({ id: "InstrumentChange", description: "What is to change of an instrument; null clears a field." });

export const calibrationFields = z
  .strictObject({
    calibratedOn: day,
    dueOn: day.describe("The last day on which it counts as calibrated."),
    laboratory: line(160).nullish(),
    certificateNumber: line(120).nullish(),
    gain: z.number().min(0.5).max(2).optional().describe("A reading counts as gain × reading + offset; 1 when left out."),
    offset: z.union([pressure, velocity, z.null()]).optional().describe("In a unit of what the instrument reads; none when left out."),
  })
  .refine(({ calibratedOn, dueOn }) => dueOn >= calibratedOn, { path: ["dueOn"], message: "The due date lies before the calibration.", params: { code: "due_before_calibration" } })
  .meta({ id: "CalibrationFields", description: "A calibration to be added." });

export const calibrationAnswer = z
  .strictObject({
    id: calibrationId, calibratedOn: day, dueOn: day, laboratory: z.string().nullable(), certificateNumber: z.string().nullable(),
    gain: z.number(), offset: z.union([pressure, velocity, z.null()]), createdAt: moment,
  })
  .meta({ id: "Calibration", description: "A calibration of an instrument." });

export const instrumentAnswer = z
  .strictObject({
    id: instrumentId, name: z.string(), manufacturer: z.string().nullable(), model: z.string().nullable(), serialNumber: z.string().nullable(),
    principle, assumedDensity: orNull(assumedDensity.unwrap()), accuracy: accuracy.unwrap().nullable(), probe: orNull(probe),
    notes: z.string().nullable(),
    calibrationDue: day.nullable().describe("Of the latest calibration; null where there is none."),
    ...times,
  })
  .meta({ id: "StoredInstrument", description: "An instrument of the firm's." });

export const instrumentsQuery = z.strictObject({
  ...pageQuery,
  q: z.string().trim().max(160).optional().describe("Only instruments with this in their name or serial number."),
  dueBefore: day.optional().describe("Only instruments whose calibration is due before this day, the earliest first."),
});

export const createInstrument = defineOperation({
  id: "createInstrument", method: "post", path: "/instruments", tag: TAG, scope: "records:write", status: 201, versioned: true,
  summary: "Make an instrument",
  description: "The principle decides how its readings are corrected for density.",
  body: instrumentFields,
  answer: instrumentAnswer,
});

export const listInstruments = defineOperation({
  id: "listInstruments", method: "get", path: "/instruments", tag: TAG, scope: "records:read",
  summary: "List instruments",
  description: "The instruments of the key's environment, by name, or by what is due.",
  query: instrumentsQuery,
  answer: page(instrumentAnswer),
});

export const readInstrument = defineOperation({
  id: "readInstrument", method: "get", path: "/instruments/{id}", tag: TAG, scope: "records:read", versioned: true,
  summary: "Read an instrument",
  description: "One instrument.",
  params,
  answer: instrumentAnswer,
  problems: ["not-found"],
});

export const changeInstrument = defineOperation({
  id: "changeInstrument", method: "patch", path: "/instruments/{id}", tag: TAG, scope: "records:write", versioned: true,
  summary: "Change an instrument",
  description: "Changes the fields that are sent. What was issued keeps the instrument as it was.",
  params,
  body: instrumentChange,
  answer: instrumentAnswer,
  problems: ["not-found", "precondition-failed"],
});

export const deleteInstrument = defineOperation({
  id: "deleteInstrument", method: "delete", path: "/instruments/{id}", tag: TAG, scope: "records:write", status: 204, versioned: true,
  summary: "Delete an instrument",
  description: "Deletes an instrument that no traverse was taken with, and its calibrations.",
  params,
  answer: z.null(),
  problems: ["not-found", "still-in-use", "precondition-failed"],
});

export const createCalibration = defineOperation({
  id: "createCalibration", method: "post", path: "/instruments/{id}/calibrations", tag: TAG, scope: "records:write", status: 201,
  summary: "Add a calibration",
  description: "The calibration in force on the day a traverse was taken applies to its readings.",
  params,
  body: calibrationFields,
  answer: calibrationAnswer,
  problems: ["not-found"],
});

export const listCalibrations = defineOperation({
  id: "listCalibrations", method: "get", path: "/instruments/{id}/calibrations", tag: TAG, scope: "records:read",
  summary: "List an instrument's calibrations",
  description: "The latest first.",
  params,
  query: z.strictObject(pageQuery),
  answer: page(calibrationAnswer),
  problems: ["not-found"],
});

export const readCalibration = defineOperation({
  id: "readCalibration", method: "get", path: "/instruments/{id}/calibrations/{calibrationId}", tag: TAG, scope: "records:read",
  summary: "Read a calibration",
  description: "One calibration. What was issued refers to the calibration of its day, so a calibration is not changed; add another.",
  params: z.strictObject({ id: instrumentId, calibrationId }),
  answer: calibrationAnswer,
  problems: ["not-found"],
});
