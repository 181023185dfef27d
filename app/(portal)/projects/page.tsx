import type { Metadata } from "next";
import Link from "next/link";
import { Button } from "@/app/_components/actions/Button";
import { LinkButton } from "@/app/_components/actions/LinkButton";
import { Pagination } from "@/app/_components/data/Pagination";
import { Table } from "@/app/_components/data/Table";
import { Time } from "@/app/_components/format/Time";
import { TextInput } from "@/app/_components/forms/TextInput";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { EmptyState } from "@/app/_components/mark/EmptyState";
import { readingOf } from "@/app/_realm";
import { requireSignedIn } from "@/app/_session";
import { listProjects } from "@/lib/records/projects";

export const metadata: Metadata = { title: "Projects" };

const LIMIT = 50;

export default async function ProjectsPage({ searchParams }: { searchParams: Promise<{ q?: string; after?: string }> }) {
  const member = await requireSignedIn();
  const { q = "", after } = await searchParams;
  const reading = await readingOf(member);
  // A cursor that is no longer one of this list begins it again.
  const { items, next } = await listProjects(reading, { limit: LIMIT, after, q }).catch(() => listProjects(reading, { limit: LIMIT, q }));
  const make = member.organisation.role === "viewer" ? null : <LinkButton href="/projects/new" variant="primary">Make a project</LinkButton>;
  const search = q ? `q=${encodeURIComponent(q)}&` : "";
  return (
    <>
      <PageHeader title="Projects" actions={make}>
        Jobs that traverses belong to.
      </PageHeader>
      <form action="/projects" role="search" className="mb-4 flex max-w-lg flex-wrap items-end gap-2">
        <div className="grow">
          <TextInput name="q" label="Find a project" type="search" defaultValue={q} maxLength={160} />
        </div>
        <Button type="submit">Find</Button>
      </form>
      {items.length === 0 ? (
        <EmptyState title={q ? "No project has this in its name or number" : "No projects yet"} action={make}>
          {q ? <Link href="/projects" className="link">All projects</Link> : "Every traverse belongs to one."}
        </EmptyState>
      ) : (
        <Table caption="Projects" hideCaption>
          <thead>
            <tr>
              <th scope="col">Name</th>
              <th scope="col">Number</th>
              <th scope="col">Location</th>
              <th scope="col">Made</th>
              <th scope="col">Records</th>
            </tr>
          </thead>
          <tbody>
            {items.map(({ id, name, number, location, createdAt }) => (
              <tr key={id}>
                <th scope="row"><Link href={`/projects/${id}`} className="link">{name}</Link></th>
                <td>{number ?? "–"}</td>
                <td>{location ?? "–"}</td>
                <td><Time value={createdAt} style="date" /></td>
                <td><Link href={`/records?projectId=${id}`} className="link">Traverses<span className="sr-only"> of {name}</span></Link></td>
              </tr>
            ))}
          </tbody>
        </Table>
      )}
      <Pagination firstHref={after ? `/projects?${search}` : undefined} nextHref={next ? `/projects?${search}after=${next}` : undefined} />
    </>
  );
}
