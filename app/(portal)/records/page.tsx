import type { Metadata } from "next";
import { LinkButton } from "@/app/_components/actions/LinkButton";
import { Pagination } from "@/app/_components/data/Pagination";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { EmptyState } from "@/app/_components/mark/EmptyState";
import { readingOf } from "@/app/_realm";
import { requireSignedIn } from "@/app/_session";
import { listInstruments } from "@/lib/records/instruments";
import { listProjects } from "@/lib/records/projects";
import { listTraverses } from "@/lib/records/traverses/list";
import { addressOf, queryOf, type RecordSearch } from "./filters";
import { RecordFilters } from "./RecordFilters";
import { RecordsDrawn } from "./RecordsDrawn";
import { RecordsTable } from "./RecordsTable";

export const metadata: Metadata = { title: "Traverses" };

const MOST_CHOICES = 200;

export default async function RecordsPage({ searchParams }: { searchParams: Promise<RecordSearch> }) {
  const member = await requireSignedIn();
  const search = await searchParams;
  const reading = await readingOf(member);
  const query = queryOf(search);
  const [list, projects, instruments] = await Promise.all([
    // A cursor that is no longer one of this list begins it again.
    listTraverses(reading, query).catch(() => listTraverses(reading, { ...query, after: undefined })),
    listProjects(reading, { limit: MOST_CHOICES }),
    listInstruments(reading, { limit: MOST_CHOICES }),
  ]);
  const named = (items: { id: string; name: string }[]) => items.map(({ id, name }) => ({ value: id, label: name }));
  const isDrawn = search.view === "drawings";
  const projectNames = new Map(projects.items.map(({ id, name }) => [id, name]));
  return (
    <>
      <PageHeader
        title="Traverses"
        actions={<LinkButton href={addressOf(search, { view: isDrawn ? undefined : "drawings" })}>{isDrawn ? "As a table" : "As drawings"}</LinkButton>}
      >
        Stored traverses: drafts, and issued records that are signed and stay.
      </PageHeader>
      <RecordFilters search={search} projects={named(projects.items)} instruments={named(instruments.items)} />
      {list.items.length === 0 ? (
        <EmptyState title="No traverse is like this">Programs store traverses through the API; the Bench keeps what was tried by hand.</EmptyState>
      ) : isDrawn ? (
        <RecordsDrawn items={list.items} />
      ) : (
        <RecordsTable items={list.items} projectNames={projectNames} />
      )}
      <Pagination firstHref={search.after ? addressOf(search, {}) : undefined} nextHref={list.next ? addressOf(search, { after: list.next }) : undefined} />
    </>
  );
}
