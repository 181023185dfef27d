import type { Metadata } from "next";
import { LinkButton } from "@/app/_components/actions/LinkButton";
import { DefinitionList } from "@/app/_components/data/DefinitionList";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { DeleteRecord } from "@/app/_components/records/DeleteRecord";
import { found } from "@/app/_found";
import { readingOf } from "@/app/_realm";
import { requireSignedIn } from "@/app/_session";
import { findProject, projectOf } from "@/lib/records/projects";
import { ProjectForm } from "../ProjectForm";

export const metadata: Metadata = { title: "Project" };

export default async function ProjectPage({ params }: { params: Promise<{ id: string }> }) {
  const member = await requireSignedIn();
  const project = projectOf(await found(findProject(await readingOf(member), (await params).id)));
  const isDeveloper = member.organisation.role !== "viewer";
  return (
    <>
      <PageHeader title={project.name} back={{ href: "/projects", label: "Projects" }} facts={[{ label: "Id", value: project.id }]} actions={<LinkButton href={`/records?projectId=${project.id}`}>Its traverses</LinkButton>} />
      {isDeveloper ? (
        <div className="grid gap-8">
          <ProjectForm key={project.updatedAt} project={project} />
          <DeleteRecord path={`projects/${project.id}/delete`} what="project" name={project.name} consequence="Only a project that holds no traverses can be deleted. This cannot be undone." back="/projects" />
        </div>
      ) : (
        <DefinitionList items={[{ term: "Number", value: project.number ?? "–" }, { term: "Location", value: project.location ?? "–" }, { term: "Notes", value: project.notes ?? "–" }]} />
      )}
    </>
  );
}
