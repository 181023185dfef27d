import Link from "next/link";
import { Table } from "@/app/_components/data/Table";
import { formatNumber, formatQuantity } from "@/app/_components/format/number";
import { Time } from "@/app/_components/format/Time";
import { RecordStanding, VerdictStanding } from "@/app/_components/records/RecordStanding";
import type { TraverseSummary } from "@/lib/records/traverses/answer";
import { Thumbnail } from "./Thumbnail";

/** Traverses as rows. */
export function RecordsTable({ items, projectNames }: { items: TraverseSummary[]; projectNames: Map<string, string> }) {
  return (
    <Table caption="Traverses" hideCaption>
      <thead>
        <tr>
          <th scope="col"><span className="sr-only">Drawing</span></th>
          <th scope="col">Place</th>
          <th scope="col">Project</th>
          <th scope="col">Taken</th>
          <th scope="col" className="numeric">Airflow</th>
          <th scope="col" className="numeric">Of design</th>
          <th scope="col">Status</th>
        </tr>
      </thead>
      <tbody>
        {items.map((item) => (
          <tr key={item.id}>
            <td><Thumbnail item={item} className="w-16" /></td>
            <th scope="row">
              <Link href={`/records/${item.id}`} className="link">{item.system ?? "No system"}</Link>
              <span className="block text-small font-normal text-muted">{item.location ?? "–"}</span>
            </th>
            <td>{projectNames.get(item.projectId) ?? "–"}</td>
            <td>
              <Time value={item.takenAt} style="date" />
              <span className="block text-small text-muted">{item.technician}</span>
            </td>
            <td className="numeric font-mono">{item.airflow ? formatQuantity(item.airflow, { decimals: 0 }) : "–"}</td>
            <td className="numeric">
              <span className="font-mono">{item.percentOfDesign === null ? "–" : `${formatNumber(item.percentOfDesign, { decimals: 1 })} %`}</span>
              {item.verdict && <span className="block text-small"><VerdictStanding verdict={item.verdict} /></span>}
            </td>
            <td>
              <RecordStanding status={item.status} />
              {item.revision > 1 && <span className="block text-small text-muted">revision {item.revision}</span>}
            </td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
