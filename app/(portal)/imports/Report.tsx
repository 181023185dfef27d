import Link from "next/link";
import { Table } from "@/app/_components/data/Table";
import { formatCount, formatNumber, formatQuantity } from "@/app/_components/format/number";
import { Notice } from "@/app/_components/layout/Notice";
import { VerdictStanding } from "@/app/_components/records/RecordStanding";
import type { ImportReport } from "@/lib/records/imports/fault";

/** What a file has in it: everything at fault, or what each of its traverses comes to. */
export function Report({ report }: { report: ImportReport }) {
  const { mode, repeated, rows, traverses, faults, faultCount } = report;
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-5">
      {faultCount > 0 ? (
        <Notice kind="failure" title={`${formatCount(faultCount, "fault")} in ${formatCount(rows, "row")}`}>
          Nothing was made. Mend the file and have it checked again.
        </Notice>
      ) : mode === "commit" ? (
        <Notice kind="good" title={repeated ? "Imported before" : `${formatCount(traverses.length, "draft")} made`}>
          {repeated ? "This very file was imported already; these are the traverses of then." : "Each can be looked at, completed and issued."}
        </Notice>
      ) : (
        <Notice kind="good" title="Nothing at fault">
          {formatCount(rows, "row")} with {formatCount(traverses.length, "traverse")}. Nothing was made yet.
        </Notice>
      )}
      {faults.length > 0 && <Faults faults={faults} />}
      {faultCount === 0 && traverses.length > 0 && <Traverses traverses={traverses} />}
    </div>
  );
}

function Faults({ faults }: Pick<ImportReport, "faults">) {
  return (
    <Table caption="Faults, by row" maxHeight="28rem">
      <thead>
        <tr>
          <th scope="col" className="numeric">Row</th>
          <th scope="col">Column</th>
          <th scope="col">What is wrong</th>
        </tr>
      </thead>
      <tbody>
        {faults.map(({ row, column, code, detail }, index) => (
          <tr key={index}>
            <th scope="row" className="numeric">{row}</th>
            <td className="font-mono text-small">{column ?? "the row"}</td>
            <td>{detail} <code className="text-muted">{code}</code></td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

/** What each traverse comes to, with its draft once there is one. */
export function Traverses({ traverses }: Pick<ImportReport, "traverses">) {
  return (
    <Table caption="Traverses in the file" maxHeight="28rem">
      <thead>
        <tr>
          <th scope="col">Traverse</th>
          <th scope="col">Place</th>
          <th scope="col" className="numeric">Readings</th>
          <th scope="col" className="numeric">Airflow</th>
          <th scope="col" className="numeric">Of design</th>
          <th scope="col">To look at</th>
        </tr>
      </thead>
      <tbody>
        {traverses.map(({ row, reference, id, system, location, readings, airflow, percentOfDesign, verdict, failedChecks }) => (
          <tr key={row}>
            <th scope="row">{id ? <Link href={`/records/${id}`} className="link">{reference ?? `row ${row}`}</Link> : (reference ?? `row ${row}`)}</th>
            <td>{[system, location].filter(Boolean).join(", ") || "–"}</td>
            <td className="numeric">{readings}</td>
            <td className="numeric font-mono">{airflow ? formatQuantity(airflow, { decimals: 0 }) : "–"}</td>
            <td className="numeric">
              {percentOfDesign === null ? "–" : `${formatNumber(percentOfDesign, { decimals: 1 })} %`} {verdict && <VerdictStanding verdict={verdict} />}
            </td>
            <td className="text-small">{failedChecks.map(({ code }) => code).join(", ") || "–"}</td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
