import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { PROBLEMS, type ProblemSlug } from "@/api-spec/problems";
import { DefinitionList } from "@/app/_components/data/DefinitionList";
import { PageHeader } from "@/app/_components/layout/PageHeader";

interface ProblemPageProps {
  params: Promise<{ slug: string }>;
}

const isProblem = (slug: string): slug is ProblemSlug => Object.hasOwn(PROBLEMS, slug);

export async function generateMetadata({ params }: ProblemPageProps): Promise<Metadata> {
  const { slug } = await params;
  return { title: isProblem(slug) ? PROBLEMS[slug].title : "No such problem" };
}

export default async function ProblemPage({ params }: ProblemPageProps) {
  const { slug } = await params;
  if (!isProblem(slug)) notFound();
  const { status, title, meaning, remedy } = PROBLEMS[slug];
  return (
    <>
      <PageHeader title={title} back={{ href: "/docs/problems", label: "Problems" }} facts={[{ label: "Problem", value: slug }, { label: "Status", value: String(status) }]} />
      <DefinitionList items={[{ term: "What it means", value: meaning }, { term: "What to do", value: remedy }]} />
    </>
  );
}
