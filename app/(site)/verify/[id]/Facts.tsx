import { DefinitionList } from "@/app/_components/data/DefinitionList";
import { Table } from "@/app/_components/data/Table";
import { formatQuantity, unitSymbol } from "@/app/_components/format/number";
import { Time } from "@/app/_components/format/Time";
import { SectionHead } from "@/app/_components/layout/SectionHead";
import type { Air, Duct, Readings } from "@/lib/airflow/types";
import { writeReadings } from "@/lib/airflow/figure/writeReadings";
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

function ReadingsAsWritten({ readings: { kind, unit, lines } }: { readings: Readings }) {
  const most = Math.max(...lines.map((line) => line.length));
  const written = writeReadings(lines.flat());
  let next = 0;
  const rows = lines.map((line) => line.map(() => written[next++] ?? "not read"));
  return (
    <section aria-labelledby="readings">
      <SectionHead id="readings" measure={`${lines.flat().length} points`}>Readings as written</SectionHead>
      <Table caption={`${kind === "velocity" ? "Velocity" : "Velocity pressure"}, ${unitSymbol(unit)}`}>
        <thead>
          <tr>
            <th scope="col">Line</th>
            {Array.from({ length: most }, (_, index) => (
              <th key={index} scope="col" className="numeric">{index + 1}</th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row, index) => (
            <tr key={index}>
              <th scope="row">{index + 1}</th>
              {Array.from({ length: most }, (_, point) => (
                <td key={point} className="numeric font-mono">{row[point] ?? ""}</td>
              ))}
            </tr>
          ))}
        </tbody>
      </Table>
    </section>
  );
}

function calibrationWords({ instrument }: IssuedDocument): string {
  const calibration = instrument?.calibration;
  if (!calibration) return "none in force on the day";
  return [`${calibration.calibratedOn}, due ${calibration.dueOn}`, calibration.laboratory, calibration.certificateNumber].filter(Boolean).join(", ");
}

function ductWords(duct: Duct): string {
  const size =
    duct.shape === "rectangular" ? `${formatQuantity(duct.width)} × ${formatQuantity(duct.height)}`
    : duct.shape === "round" ? `${formatQuantity(duct.diameter)} across`
    : `${formatQuantity(duct.major)} × ${formatQuantity(duct.minor)}`;
  const walls = [duct.wall?.thickness && `wall ${formatQuantity(duct.wall.thickness)}`, duct.wall?.lining && `lining ${formatQuantity(duct.wall.lining)}`].filter(Boolean);
  return [`${duct.shape.replace("_", " ")}, ${size} ${duct.measured}`, ...walls].join(", ");
}

function airWords(air: Air | undefined): string {
  if (!air) return "standard air assumed";
  if ("density" in air) return `density ${formatQuantity(air.density)}`;
  const humidity =
    air.relativeHumidity ? `${formatQuantity(air.relativeHumidity)} relative humidity`
    : air.wetBulb ? `wet bulb ${formatQuantity(air.wetBulb)}`
    : air.dewPoint ? `dew point ${formatQuantity(air.dewPoint)}`
    : air.humidityRatio !== undefined ? `humidity ratio ${air.humidityRatio}`
    : "dry";
  return [
    `dry bulb ${formatQuantity(air.dryBulb)}`, humidity,
    air.altitude && `altitude ${formatQuantity(air.altitude)}`, air.barometricPressure && `barometric ${formatQuantity(air.barometricPressure)}`,
    air.ductStaticPressure && `duct static ${formatQuantity(air.ductStaticPressure)}`,
  ].filter(Boolean).join(", ");
}
