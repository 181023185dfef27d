import { calibrationOn } from "../calibrations";
import type { RecordContext } from "../context";
import { dayOf, instruments, type InstrumentProperties } from "../instruments";
import type { InstrumentSnapshot } from "../issuedDocument";
import { noSuchReference } from "../noSuchRecord";
import type { Calibration } from "../calibrations";

/** An instrument as it was on a day, with what the calculation takes of it. */
export interface DatedInstrument extends InstrumentSnapshot {
  properties: InstrumentProperties;
  gain: number;
  offset: Calibration["offset"];
}

/** The instrument of a traverse as it was when the traverse was taken, or is today where that is not known yet. */
export async function datedInstrument(context: Pick<RecordContext, "db" | "realm">, instrumentId: string | null, takenAt: Date | null): Promise<DatedInstrument | null> {
  if (instrumentId === null) return null;
  const row = await instruments(context).where("instruments.id", instrumentId).first();
  if (!row) throw noSuchReference("/instrumentId", "instrument");
  const calibration = await calibrationOn(context, instrumentId, dayOf(takenAt ?? new Date()));
  return {
    id: row.id,
    name: row.name,
    manufacturer: row.manufacturer,
    model: row.model,
    serialNumber: row.serial_number,
    calibration: calibration
      ? { id: calibration.id, calibratedOn: dayOf(calibration.calibrated_on), dueOn: dayOf(calibration.due_on), laboratory: calibration.laboratory, certificateNumber: calibration.certificate_number }
      : null,
    properties: row.properties,
    gain: calibration?.gain ?? 1,
    offset: calibration?.offset ?? null,
  };
}

/** What is told of it; the numbers that were calculated with stand in the measurement. */
export const snapshotOf = ({ properties: _properties, gain: _gain, offset: _offset, ...snapshot }: DatedInstrument): InstrumentSnapshot => snapshot;
