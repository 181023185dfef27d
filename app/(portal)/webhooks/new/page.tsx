import type { Metadata } from "next";
import { Notice } from "@/app/_components/layout/Notice";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { requireSignedIn } from "@/app/_session";
import { NewEndpointForm } from "./NewEndpointForm";

export const metadata: Metadata = { title: "Make a webhook endpoint" };

export default async function NewEndpointPage() {
  const { organisation } = await requireSignedIn();
  return (
    <>
      <PageHeader title="Make a webhook endpoint" back={{ href: "/webhooks", label: "Webhooks" }}>
        Events of the environment you see are posted to it from now on.
      </PageHeader>
      {organisation.role === "viewer" ? <Notice kind="caution">Viewers read. Ask an owner or a developer of {organisation.name}.</Notice> : <NewEndpointForm />}
    </>
  );
}
