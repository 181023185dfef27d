import type { Metadata } from "next";
import { Notice } from "@/app/_components/layout/Notice";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { requireSignedIn } from "@/app/_session";
import { config } from "@/lib/runtime/config";
import { NewKeyForm } from "./NewKeyForm";

export const metadata: Metadata = { title: "Make a key" };

export default async function NewKeyPage() {
  const { organisation, emailVerified } = await requireSignedIn();
  return (
    <>
      <PageHeader title="Make a key" back={{ href: "/keys", label: "Keys" }}>
        Give each program a key of its own, with no more scopes than it needs.
      </PageHeader>
      {organisation.role === "viewer" ? (
        <Notice kind="caution">Viewers read. Ask an owner or a developer of {organisation.name} for a key.</Notice>
      ) : emailVerified ? (
        <NewKeyForm baseUrl={config().AVERDUCT_URL} />
      ) : null}
    </>
  );
}
