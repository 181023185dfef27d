import type { Knex } from "knex";
import { database } from "@/db/connection";
import { dayOf } from "@/lib/records/instruments";
import type { Realm } from "@/lib/records/realm";
import { recordEvent } from "./recordEvent";

const NOTICE_MS = 14 * 24 * 3_600_000;
const INSTRUMENTS_AT_ONCE = 200;

interface DueInstrument {
  id: string;
  organisation_id: string;
  environment: Realm["environment"];
  name: string;
  serial_number: string | null;
  calibration_due: Date;
}

/** Writes an event for each instrument, of any realm, whose calibration is due soon or has lapsed and that was not told of yet. */
export async function calibrationDueEvents(db: Knex = database(), now = Date.now()): Promise<void> {
  while ((await tellOfSome(db, now)) === INSTRUMENTS_AT_ONCE);
}

/** Rows that another instance is telling of are passed over, so that none is told of twice. */
const tellOfSome = (db: Knex, now: number): Promise<number> =>
  db.transaction(async (transaction) => {
    const due = await transaction<DueInstrument>("instruments")
      .whereNull("calibration_due_told_at")
      .where("calibration_due", "<=", dayOf(new Date(now + NOTICE_MS)))
      .orderBy("calibration_due")
      .limit(INSTRUMENTS_AT_ONCE)
      .forUpdate()
      .skipLocked()
      .select("id", "organisation_id", "environment", "name", "serial_number", "calibration_due");
    for (const { id, organisation_id: organisationId, environment, name, serial_number, calibration_due } of due) {
      await recordEvent(transaction, { organisationId, environment }, "instrument.calibration_due", { instrumentId: id, name, serialNumber: serial_number, calibrationDue: dayOf(calibration_due) });
    }
    await transaction("instruments").whereIn("id", due.map(({ id }) => id)).update({ calibration_due_told_at: new Date(now) });
    return due.length;
  }, { isolationLevel: "read committed" });
