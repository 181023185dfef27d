import type { Metadata } from "next";
import { signedIn } from "@/app/_session";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { ReferenceLoader } from "./ReferenceLoader";

export const metadata: Metadata = { title: "API reference" };

export default async function ReferencePage() {
  const person = await signedIn();
  const canMakeKey = Boolean(person?.emailVerified && person.organisation && person.organisation.role !== "viewer");
  return (
    <>
      <PageHeader title="API reference">
        Every operation with its fields, examples and problems, generated from the definitions that check the requests. The document itself is at{" "}
        <a href="/api/v1/openapi.json" className="link">
          /api/v1/openapi.json
        </a>
        .
      </PageHeader>
      <ReferenceLoader canMakeKey={canMakeKey} />
    </>
  );
}
