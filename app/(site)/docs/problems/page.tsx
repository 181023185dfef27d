import type { Metadata } from "next";
import Link from "next/link";
import { PROBLEMS } from "@/api-spec/problems";
import { DataTable } from "@/app/_components/data/DataTable";
import { PageHeader } from "@/app/_components/layout/PageHeader";

export const metadata: Metadata = { title: "Problems" };

export default function ProblemsPage() {
  return (
    <>
      <PageHeader title="Problems">Every kind of problem an answer can carry. Its type is the address of its page.</PageHeader>
      <DataTable
        caption="Problems"
        hideCaption
        filter="Find a problem"
        columns={[{ key: "slug", header: "Problem" }, { key: "status", header: "Status" }, { key: "title", header: "Title" }]}
        rows={Object.entries(PROBLEMS).map(([slug, { status, title }]) => ({
          id: slug,
          cells: { slug: { show: <Link href={`/docs/problems/${slug}`} className="link font-mono text-small">{slug}</Link>, value: slug }, status, title },
        }))}
      />
    </>
  );
}
