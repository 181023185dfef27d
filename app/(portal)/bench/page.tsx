import type { Metadata } from "next";
import { Bench } from "@/app/_components/bench/Bench";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { readingOf } from "@/app/_realm";
import { requireSignedIn } from "@/app/_session";
import { listProjects } from "@/lib/records/projects";

export const metadata: Metadata = { title: "Bench" };

export default async function BenchPage() {
  const member = await requireSignedIn();
  const { items } = await listProjects(await readingOf(member), { limit: 200 });
  return (
    <>
      <PageHeader title="Bench">Try a traverse by hand. Plan, figure and answer follow as you type, by the same engine that answers the API.</PageHeader>
      <Bench projects={member.organisation.role === "viewer" ? null : items.map(({ id, name }) => ({ id, name }))} />
    </>
  );
}
