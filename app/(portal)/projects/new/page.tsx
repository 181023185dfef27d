import type { Metadata } from "next";
import { Notice } from "@/app/_components/layout/Notice";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { requireSignedIn } from "@/app/_session";
import { ProjectForm } from "../ProjectForm";

export const metadata: Metadata = { title: "Make a project" };

export default async function NewProjectPage() {
  const { organisation } = await requireSignedIn();
  return (
    <>
      <PageHeader title="Make a project" back={{ href: "/projects", label: "Projects" }} />
      {organisation.role === "viewer" ? <Notice kind="caution">Viewers read. Ask an owner or a developer of {organisation.name}.</Notice> : <ProjectForm />}
    </>
  );
}
