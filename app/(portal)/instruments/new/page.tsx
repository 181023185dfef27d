import type { Metadata } from "next";
import { Notice } from "@/app/_components/layout/Notice";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { requireSignedIn } from "@/app/_session";
import { InstrumentForm } from "../InstrumentForm";

export const metadata: Metadata = { title: "Add an instrument" };

export default async function NewInstrumentPage() {
  const { organisation } = await requireSignedIn();
  return (
    <>
      <PageHeader title="Add an instrument" back={{ href: "/instruments", label: "Instruments" }} />
      {organisation.role === "viewer" ? <Notice kind="caution">Viewers read. Ask an owner or a developer of {organisation.name}.</Notice> : <InstrumentForm />}
    </>
  );
}
