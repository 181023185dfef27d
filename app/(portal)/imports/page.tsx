import type { Metadata } from "next";
import Link from "next/link";
import { Table } from "@/app/_components/data/Table";
import { formatNumber } from "@/app/_components/format/number";
import { Time } from "@/app/_components/format/Time";
import { Notice } from "@/app/_components/layout/Notice";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { SectionHead } from "@/app/_components/layout/SectionHead";
import { readingOf } from "@/app/_realm";
import { requireSignedIn } from "@/app/_session";
import { listImports } from "@/lib/records/imports/listImports";
import { listProjects } from "@/lib/records/projects";
import { ImportFile } from "./ImportFile";

export const metadata: Metadata = { title: "Imports" };

export default async function ImportsPage() {
  const member = await requireSignedIn();
  const reading = await readingOf(member);
  const [{ items }, projects] = await Promise.all([listImports(reading, { limit: 25 }), listProjects(reading, { limit: 200 })]);
  return (
    <>
      <PageHeader title="Imports">
        Traverses from a CSV file: <a href="/api/portal/imports/templates/row-per-traverse.csv" download className="link">one row a traverse</a> or{" "}
        <a href="/api/portal/imports/templates/row-per-reading.csv" download className="link">one row a reading</a> (templates to fill in). The file is checked first; the drafts are made all together or not at all.
        What each column takes is in the <Link href="/docs/reference" className="link">reference</Link>.
      </PageHeader>
      <div className="grid grid-cols-[minmax(0,1fr)] gap-8">
        {member.organisation.role === "viewer" ? (
          <Notice kind="caution">Viewers read. Ask an owner or a developer of {member.organisation.name}.</Notice>
        ) : (
          <ImportFile projects={projects.items.map(({ id, name }) => ({ value: id, label: name }))} />
        )}
        {items.length > 0 && (
          <section aria-labelledby="past">
            <SectionHead id="past">Imported before</SectionHead>
            <Table caption="Imported before, the latest first" hideCaption>
              <thead>
                <tr>
                  <th scope="col">When</th>
                  <th scope="col">File</th>
                  <th scope="col" className="numeric">Rows</th>
                  <th scope="col" className="numeric">Drafts made</th>
                </tr>
              </thead>
              <tbody>
                {items.map(({ id, name, rows, traverses, createdAt }) => (
                  <tr key={id}>
                    <td><Time value={createdAt} /></td>
                    <th scope="row"><Link href={`/imports/${id}`} className="link">{name ?? id}</Link></th>
                    <td className="numeric">{formatNumber(rows)}</td>
                    <td className="numeric">{formatNumber(traverses)}</td>
                  </tr>
                ))}
              </tbody>
            </Table>
          </section>
        )}
      </div>
    </>
  );
}
