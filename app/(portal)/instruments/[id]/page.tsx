import type { Metadata } from "next";
import { LinkButton } from "@/app/_components/actions/LinkButton";
import { DefinitionList } from "@/app/_components/data/DefinitionList";
import { Table } from "@/app/_components/data/Table";
import { formatCount, formatNumber } from "@/app/_components/format/number";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { SectionHead } from "@/app/_components/layout/SectionHead";
import { DeleteRecord } from "@/app/_components/records/DeleteRecord";
import { found } from "@/app/_found";
import { readingOf } from "@/app/_realm";
import { requireSignedIn } from "@/app/_session";
import { listCalibrations, type Calibration } from "@/lib/records/calibrations";
import { findInstrument, instrumentOf } from "@/lib/records/instruments";
import { CalibrationStanding } from "../CalibrationStanding";
import { InstrumentForm } from "../InstrumentForm";
import { PRINCIPLES } from "../principles";
import { CalibrationForm } from "./CalibrationForm";

export const metadata: Metadata = { title: "Instrument" };

export default async function InstrumentPage({ params }: { params: Promise<{ id: string }> }) {
  const member = await requireSignedIn();
  const { id } = await params;
  const reading = await readingOf(member);
  const instrument = instrumentOf(await found(findInstrument(reading, id)));
  const { items } = await listCalibrations(reading, id, { limit: 100 });
  const isDeveloper = member.organisation.role !== "viewer";
  return (
    <>
      <PageHeader
        title={instrument.name}
        back={{ href: "/instruments", label: "Instruments" }}
        facts={[{ label: "Calibration", value: <CalibrationStanding due={instrument.calibrationDue} /> }, { label: "Principle", value: PRINCIPLES[instrument.principle] }, { label: "Id", value: instrument.id }]}
        actions={<LinkButton href={`/records?instrumentId=${id}`}>Its traverses</LinkButton>}
      />
      <div className="grid grid-cols-[minmax(0,1fr)] gap-8">
        <section aria-labelledby="calibrations" className="grid gap-4">
          <SectionHead id="calibrations" measure={formatCount(items.length, "calibration")}>Calibrations</SectionHead>
          {items.length > 0 && <CalibrationsTable calibrations={items} />}
          {isDeveloper && <CalibrationForm instrumentId={id} />}
        </section>
        <section aria-labelledby="instrument" className="grid gap-4">
          <SectionHead id="instrument">The instrument</SectionHead>
          {isDeveloper ? (
            <>
              <InstrumentForm key={instrument.updatedAt} instrument={instrument} />
              <DeleteRecord path={`instruments/${id}/delete`} what="instrument" name={instrument.name} consequence="Only an instrument that no traverse was taken with can be deleted; its calibrations go with it. This cannot be undone." back="/instruments" />
            </>
          ) : (
            <DefinitionList items={[{ term: "Serial number", value: instrument.serialNumber ?? "–" }, { term: "Manufacturer", value: instrument.manufacturer ?? "–" }, { term: "Model", value: instrument.model ?? "–" }, { term: "Notes", value: instrument.notes ?? "–" }]} />
          )}
        </section>
      </div>
    </>
  );
}

function CalibrationsTable({ calibrations }: { calibrations: Calibration[] }) {
  return (
    <Table caption="Calibrations, the latest first" hideCaption>
      <thead>
        <tr>
          <th scope="col">Calibrated on</th>
          <th scope="col">Due on</th>
          <th scope="col">Laboratory</th>
          <th scope="col">Certificate</th>
          <th scope="col" className="numeric">Gain</th>
        </tr>
      </thead>
      <tbody>
        {calibrations.map(({ id, calibratedOn, dueOn, laboratory, certificateNumber, gain }) => (
          <tr key={id}>
            <th scope="row">{calibratedOn}</th>
            <td>{dueOn}</td>
            <td>{laboratory ?? "–"}</td>
            <td>{certificateNumber ?? "–"}</td>
            <td className="numeric">{formatNumber(gain)}</td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
