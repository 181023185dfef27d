import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { cache } from "react";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { SectionHead } from "@/app/_components/layout/SectionHead";
import { Figure } from "@/app/_components/figures/Figure";
import { UncertaintyBars } from "@/app/_components/figures/UncertaintyBars";
import { ChecksList } from "@/app/_components/data/ChecksList";
import { WorkingTable } from "@/app/_components/data/WorkingTable";
import { resultFigure } from "@/lib/airflow/figure/resultFigure";
import type { IssuedDocument } from "@/lib/records/issuedDocument";
import { verifyRecord } from "@/lib/records/verifyRecord";
import { CheckItYourself } from "./CheckItYourself";
import { Facts } from "./Facts";
import { Outcome } from "./Outcome";
import { ResultHead } from "@/app/_components/data/ResultHead";
import { Standing } from "./Standing";

interface Props {
  params: Promise<{ id: string }>;
}

const TRAVERSE_ID = /^trv_[0-7][0-9a-hjkmnp-tv-z]{25}$/;
const recordOf = cache(async (id: string) => (TRAVERSE_ID.test(id) ? verifyRecord(id) : null));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { id } = await params;
  // What stands on a certificate is for whoever holds it, not for search engines.
  return { title: `Record ${id}`, robots: { index: false } };
}

/** What anyone who holds a certificate sees: whether the record is as it was signed, and everything that was. */
export default async function VerifyPage({ params }: Props) {
  const { id } = await params;
  const record = await recordOf(id);
  if (!record) notFound();
  const { document, state } = record;
  return (
    <article className="mx-auto grid max-w-240 grid-cols-[minmax(0,1fr)] gap-6">
      <PageHeader title="Record of a duct traverse">
        {document ? `${document.organisation.name}, revision ${document.revision}.` : "What was signed cannot be read any more."}
        {document?.environment === "sandbox" && " Made in a sandbox: a trial, not a measurement to rely on."}
      </PageHeader>
      <Outcome state={state} />
      <Standing record={record} />
      {document && (
        <>
          <ResultHead result={document.result} />
          <section aria-label="Figure">
            <Figure svg={drawn(document)} narrow={drawn(document, NARROW)} />
          </section>
          <Facts document={document} />
          <section aria-labelledby="checks">
            <SectionHead id="checks" measure={`${document.result.checks.length} checks`}>Checks</SectionHead>
            <ChecksList checks={document.result.checks} />
          </section>
          <section aria-labelledby="uncertainty">
            <SectionHead id="uncertainty">How sure it is</SectionHead>
            <UncertaintyBars {...document.result.uncertainty} />
          </section>
          <section aria-labelledby="working">
            <SectionHead id="working" measure={`${document.result.working?.length ?? 0} steps`}>Working</SectionHead>
            <WorkingTable steps={document.result.working ?? []} caption="Working, step by step" />
          </section>
        </>
      )}
      <CheckItYourself id={id} keyId={record.keyId} />
    </article>
  );
}

/** Drawing units across a telephone. */
const NARROW = 360;

const drawn = ({ measurement, result, system, location }: IssuedDocument, width?: number): string =>
  resultFigure({ ...measurement, result, title: [system, location].filter(Boolean).join(", ") || "Traverse", width });
