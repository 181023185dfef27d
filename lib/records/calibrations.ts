import type { z } from "zod";
import type { calibrationAnswer, calibrationFields } from "@/api-spec/records/instruments";
import { newId } from "@/lib/ids/newId";
import type { RecordContext } from "./context";
import { dayOf, findInstrument, instruments } from "./instruments";
import { noSuchRecord } from "./noSuchRecord";
import { pageOf, type Page, type PageRequest } from "./page";
import { addRecord, recordsOf } from "./realm";

export type Calibration = z.output<typeof calibrationAnswer>;
type Reading = Pick<RecordContext, "db" | "realm">;

export interface CalibrationRow {
  id: string;
  instrument_id: string;
  calibrated_on: Date;
  due_on: Date;
  laboratory: string | null;
  certificate_number: string | null;
  gain: number;
  offset: Calibration["offset"];
  created_at: Date;
}

export const calibrationOf = ({ id, calibrated_on, due_on, laboratory, certificate_number, gain, offset, created_at }: CalibrationRow): Calibration => ({
  id, calibratedOn: dayOf(calibrated_on), dueOn: dayOf(due_on), laboratory, certificateNumber: certificate_number, gain, offset, createdAt: created_at.toISOString(),
});

const calibrationsOf = ({ db, realm }: Reading, instrumentId: string) => recordsOf<CalibrationRow>(db, "calibrations", realm).where("calibrations.instrument_id", instrumentId);

/** Adds a calibration, and keeps with the instrument when its latest one is due. */
export async function addCalibration(context: RecordContext, instrumentId: string, fields: z.output<typeof calibrationFields>): Promise<CalibrationRow> {
  await findInstrument(context, instrumentId, true);
  const id = newId("cal");
  await addRecord(context.db, "calibrations", context.realm, {
    id, instrument_id: instrumentId, calibrated_on: fields.calibratedOn, due_on: fields.dueOn, laboratory: fields.laboratory ?? null,
    certificate_number: fields.certificateNumber ?? null, gain: fields.gain ?? 1, offset: fields.offset ? JSON.stringify(fields.offset) : null, created_at: new Date(),
  });
  const latest = (await calibrationOn(context, instrumentId, "9999-12-31"))!;
  await instruments(context).where("instruments.id", instrumentId).update({ calibration_due: latest.due_on, calibration_due_told_at: null, updated_at: new Date() } as never);
  return findCalibration(context, instrumentId, id);
}

export async function findCalibration(context: Reading, instrumentId: string, id: string): Promise<CalibrationRow> {
  const row = await calibrationsOf(context, instrumentId).where("calibrations.id", id).first();
  if (!row) throw noSuchRecord("calibration");
  return row;
}

export async function listCalibrations(context: Reading, instrumentId: string, page: PageRequest): Promise<Page<Calibration>> {
  await findInstrument(context, instrumentId);
  const order = { column: "calibrations.calibrated_on", direction: "desc" as const, valueOf: ({ calibrated_on }: CalibrationRow) => dayOf(calibrated_on) };
  const { items, next } = await pageOf(calibrationsOf(context, instrumentId), "calibrations", order, page);
  return { items: items.map(calibrationOf), next };
}

/** The calibration that applied on a day: the latest one made by then, whether still good or not. */
export const calibrationOn = (context: Reading, instrumentId: string, day: string): Promise<CalibrationRow | undefined> =>
  calibrationsOf(context, instrumentId).where("calibrations.calibrated_on", "<=", day).orderBy([{ column: "calibrated_on", order: "desc" }, { column: "id", order: "desc" }]).first();
