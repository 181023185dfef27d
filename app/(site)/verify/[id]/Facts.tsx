import { DefinitionList } from "@/app/_components/data/DefinitionList";
import { Time } from "@/app/_components/format/Time";
import { SectionHead } from "@/app/_components/layout/SectionHead";
import { ReadingsAsWritten } from "@/app/_components/records/ReadingsAsWritten";
import { airWords, ductWords } from "@/app/_components/records/words";
import type { IssuedDocument } from "@/lib/records/issuedDocument";

/** Everything that was written down of the traverse: where, who, with what, in which duct and air, and each reading. */
export function Facts({ document }: { document: IssuedDocument }) {
  const { project, system, location, technician, organisation, takenAt, issuedAt, notes, holes, instrument, calibrationWaiver, measurement } = document;
  const facts = [
    { term: "Project", value: [project.name, project.number, project.location].filter(Boolean).join(", ") },
    { term: "System", value: [system, location].filter(Boolean).join(", ") || "not said" },
    { term: "Taken", value: <><Time value={takenAt} /> by {technician}, {organisation.name}</> },
    { term: "Issued", value: <Time value={issuedAt} /> },
    { term: "Instrument", value: instrument ? [instrument.name, instrument.manufacturer, instrument.model, instrument.serialNumber].filter(Boolean).join(", ") : "not named" },
    { term: "Calibration", value: calibrationWords(document) },
    ...(calibrationWaiver ? [{ term: "Issued without calibration", value: calibrationWaiver.reason }] : []),
    { term: "Duct", value: ductWords(measurement.duct) },
    { term: "Air", value: airWords(measurement.air) },
    { term: "Holes", value: `${holes.count}, ${holes.sealed ? "sealed" : "not sealed"}${holes.method ? `, ${holes.method}` : ""}` },
    ...(notes ? [{ term: "Notes", value: <span className="whitespace-pre-line">{notes}</span> }] : []),
    { term: "Record", value: <code className="break-all">{document.id}</code> },
    { term: "Engine", value: document.engineVersion },
  ];
  return (
    <>
      <section aria-labelledby="facts">
        <SectionHead id="facts">What was measured</SectionHead>
        <DefinitionList items={facts} />
      </section>
      <ReadingsAsWritten readings={measurement.readings} />
    </>
  );
}

function calibrationWords({ instrument }: IssuedDocument): string {
  const calibration = instrument?.calibration;
  if (!calibration) return "none in force on the day";
  return [`${calibration.calibratedOn}, due ${calibration.dueOn}`, calibration.laboratory, calibration.certificateNumber].filter(Boolean).join(", ");
}
