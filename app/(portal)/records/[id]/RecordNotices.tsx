import Link from "next/link";
import { Time } from "@/app/_components/format/Time";
import { Notice } from "@/app/_components/layout/Notice";
import type { Traverse } from "@/lib/records/traverses/answer";

/** How the record stands: what a draft still needs, what it replaces, what has replaced it, why it is void. */
export function RecordNotices({ traverse: { status, missingForIssue, supersedes, supersededBy, voided, newerEngine } }: { traverse: Traverse }) {
  const to = (id: string) => <Link href={`/records/${id}`}>{id}</Link>;
  return (
    <div className="grid gap-3">
      {voided && <Notice kind="failure" title="Void">Withdrawn on <Time value={voided.at} style="date" />: {voided.reason}</Notice>}
      {status === "superseded" && supersededBy && <Notice kind="caution" title="Superseded">A later revision stands in its place: {to(supersededBy)}.</Notice>}
      {supersedes && <Notice title="A revision">{status === "draft" ? "It is to supersede" : "It superseded"} {to(supersedes)}.</Notice>}
      {missingForIssue.length > 0 && (
        <Notice kind="caution" title="Not ready to be issued">
          <ul className="list-disc pl-5">
            {missingForIssue.map(({ code, detail }) => (
              <li key={code}>{detail}</li>
            ))}
          </ul>
        </Notice>
      )}
      {newerEngine && <Notice title="A newer engine">Version {newerEngine.version} would give {newerEngine.airflow.value.toFixed(1)} {newerEngine.airflow.unit}. What was stored stays as it is.</Notice>}
    </div>
  );
}
