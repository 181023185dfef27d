import type { Metadata } from "next";
import Link from "next/link";
import { LinkButton } from "@/app/_components/actions/LinkButton";
import { DataTable, type Row } from "@/app/_components/data/DataTable";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { EmptyState } from "@/app/_components/mark/EmptyState";
import { readingOf } from "@/app/_realm";
import { requireSignedIn } from "@/app/_session";
import { listInstruments, type StoredInstrument } from "@/lib/records/instruments";
import { CalibrationStanding } from "./CalibrationStanding";
import { PRINCIPLES } from "./principles";

export const metadata: Metadata = { title: "Instruments" };

/** A firm has tens of instruments. */
const MOST = 200;

const COLUMNS = [
  { key: "name", header: "Name" },
  { key: "serial", header: "Serial number" },
  { key: "principle", header: "Principle" },
  { key: "due", header: "Calibration" },
];

const toRow = (instrument: StoredInstrument): Row => ({
  id: instrument.id,
  cells: {
    name: { show: <Link href={`/instruments/${instrument.id}`} className="link">{instrument.name}</Link>, value: instrument.name },
    serial: instrument.serialNumber ?? "–",
    principle: PRINCIPLES[instrument.principle],
    // Never calibrated comes before everything that is due.
    due: { show: <CalibrationStanding due={instrument.calibrationDue} />, value: instrument.calibrationDue ?? "" },
  },
});

export default async function InstrumentsPage() {
  const member = await requireSignedIn();
  const { items } = await listInstruments(await readingOf(member), { limit: MOST });
  const make = member.organisation.role === "viewer" ? null : <LinkButton href="/instruments/new" variant="primary">Add an instrument</LinkButton>;
  return (
    <>
      <PageHeader title="Instruments" actions={make}>
        What is due for calibration stands first. A traverse is issued with an instrument that was in calibration on the day.
      </PageHeader>
      <DataTable
        caption="Instruments"
        hideCaption
        columns={COLUMNS}
        rows={items.map(toRow)}
        filter="Find an instrument"
        sortedBy={{ key: "due" }}
        empty={<EmptyState title="No instruments yet" action={make}>The principle of an instrument decides how its readings are corrected for density.</EmptyState>}
      />
    </>
  );
}
