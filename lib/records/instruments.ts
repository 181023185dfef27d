import type { z } from "zod";
import type { instrumentAnswer, instrumentChange, instrumentFields, instrumentsQuery } from "@/api-spec/records/instruments";
import { newId } from "@/lib/ids/newId";
import { refusal } from "@/lib/problems/problem";
import type { RecordContext } from "./context";
import { noSuchRecord } from "./noSuchRecord";
import { containing, pageOf, type Page } from "./page";
import { addRecord, recordsOf } from "./realm";

export type StoredInstrument = z.output<typeof instrumentAnswer>;
type Fields = z.output<typeof instrumentFields>;
type Reading = Pick<RecordContext, "db" | "realm">;

/** The properties that the calculations take, kept together. */
export type InstrumentProperties = Pick<Fields, "principle" | "assumedDensity" | "accuracy" | "probe">;

export interface InstrumentRow {
  id: string;
  version: number;
  name: string;
  manufacturer: string | null;
  model: string | null;
  serial_number: string | null;
  properties: InstrumentProperties;
  calibration_due: Date | null;
  notes: string | null;
  created_at: Date;
  updated_at: Date;
}

/** A DATE column as its day; the driver gives it as midnight UTC. */
export const dayOf = (date: Date): string => date.toISOString().slice(0, 10);

export const instrumentOf = ({ id, name, manufacturer, model, serial_number, properties, calibration_due, notes, created_at, updated_at }: InstrumentRow): StoredInstrument => ({
  id, name, manufacturer, model, serialNumber: serial_number,
  principle: properties.principle, assumedDensity: properties.assumedDensity ?? null, accuracy: properties.accuracy ?? null, probe: properties.probe ?? null,
  notes, calibrationDue: calibration_due && dayOf(calibration_due),
  createdAt: created_at.toISOString(), updatedAt: updated_at.toISOString(),
});

export const instruments = ({ db, realm }: Reading) => recordsOf<InstrumentRow>(db, "instruments", realm);

/** The row of an instrument. Throws the problem where there is none. */
export async function findInstrument(context: Reading, id: string, lock = false): Promise<InstrumentRow> {
  const query = instruments(context).where("instruments.id", id);
  const row = await (lock ? query.forUpdate() : query).first();
  if (!row) throw noSuchRecord("instrument");
  return row;
}

const columnsOf = ({ serialNumber, principle: _p, assumedDensity: _d, accuracy: _a, probe: _b, ...rest }: z.output<typeof instrumentChange>) => ({
  ...rest,
  ...(serialNumber !== undefined && { serial_number: serialNumber }),
});

/** The properties with what is sent put in and what is null taken out. */
function propertiesWith(before: Partial<InstrumentProperties>, { principle, assumedDensity, accuracy, probe }: z.output<typeof instrumentChange>): InstrumentProperties {
  const sent = Object.entries({ principle, assumedDensity, accuracy, probe }).filter(([, value]) => value !== undefined);
  return Object.fromEntries(Object.entries({ ...before, ...Object.fromEntries(sent) }).filter(([, value]) => value !== null)) as unknown as InstrumentProperties;
}

export async function createInstrument(context: RecordContext, fields: Fields): Promise<InstrumentRow> {
  const id = newId("ins");
  const now = new Date();
  await addRecord(context.db, "instruments", context.realm, { id, ...columnsOf(fields), properties: JSON.stringify(propertiesWith({}, fields)), created_at: now, updated_at: now });
  return findInstrument(context, id);
}

export async function listInstruments(context: Reading, { q, dueBefore, ...page }: z.output<typeof instrumentsQuery>): Promise<Page<StoredInstrument>> {
  const query = instruments(context);
  if (q) query.where((some) => some.where("instruments.name", "like", containing(q)).orWhere("instruments.serial_number", "like", containing(q)));
  if (dueBefore) query.where("instruments.calibration_due", "<", dueBefore);
  const order = dueBefore
    ? { column: "instruments.calibration_due", direction: "asc" as const, valueOf: ({ calibration_due }: InstrumentRow) => dayOf(calibration_due!) }
    : { column: "instruments.name", direction: "asc" as const, valueOf: ({ name }: InstrumentRow) => name };
  const { items, next } = await pageOf(query, "instruments", order, page);
  return { items: items.map(instrumentOf), next };
}

/** Changes what is sent. @param requireMatch Throws unless the version is the one the caller saw. */
export async function changeInstrument(context: RecordContext, id: string, change: z.output<typeof instrumentChange>, requireMatch: (version: number) => void): Promise<InstrumentRow> {
  const row = await findInstrument(context, id, true);
  requireMatch(row.version);
  await instruments(context).where("instruments.id", id).update({ ...columnsOf(change), properties: JSON.stringify(propertiesWith(row.properties, change)), version: row.version + 1, updated_at: new Date() } as never);
  return findInstrument(context, id);
}

export async function deleteInstrument(context: RecordContext, id: string, requireMatch: (version: number) => void): Promise<void> {
  const row = await findInstrument(context, id, true);
  requireMatch(row.version);
  const used = await recordsOf<{ id: string }>(context.db, "traverses", context.realm).where("instrument_id", id).first("traverses.id");
  if (used) {
    throw refusal("still-in-use", "Traverses were taken with this instrument.", { code: "instrument_in_use" });
  }
  await instruments(context).where("instruments.id", id).delete();
}
