import type { Metadata } from "next";
import { Time } from "@/app/_components/format/Time";
import { formatCount } from "@/app/_components/format/number";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { found } from "@/app/_found";
import { readingOf } from "@/app/_realm";
import { requireSignedIn } from "@/app/_session";
import { readImport } from "@/lib/records/imports/listImports";
import { Traverses } from "../Report";

export const metadata: Metadata = { title: "Import" };

export default async function ImportPage({ params }: { params: Promise<{ id: string }> }) {
  const member = await requireSignedIn();
  const { id } = await params;
  const { name, rows, traverses, createdAt } = await found(readImport(await readingOf(member), id));
  const facts = [
    { label: "Imported", value: <Time value={createdAt!} /> },
    { label: "File", value: formatCount(rows, "row") },
    { label: "Drafts made", value: String(traverses.length) },
  ];
  return (
    <>
      <PageHeader title={name ?? id} facts={facts} back={{ href: "/imports", label: "Imports" }}>
        What the file came to when it was imported. Drafts may have been changed, issued or deleted since.
      </PageHeader>
      <Traverses traverses={traverses} />
    </>
  );
}
