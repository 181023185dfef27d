import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { DefinitionList } from "@/app/_components/data/DefinitionList";
import { Time } from "@/app/_components/format/Time";
import { Notice } from "@/app/_components/layout/Notice";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { SectionHead } from "@/app/_components/layout/SectionHead";
import { EmptyState } from "@/app/_components/mark/EmptyState";
import { LinkButton } from "@/app/_components/actions/LinkButton";
import { readingOf } from "@/app/_realm";
import { requireSignedIn } from "@/app/_session";
import { Problem } from "@/lib/problems/problem";
import { listDeliveries } from "@/lib/webhooks/deliveries";
import { endpointOf, findEndpoint } from "@/lib/webhooks/endpoints";
import { EndpointStanding } from "../EndpointStanding";
import { DeliveriesTable } from "./DeliveriesTable";
import { EndpointActions } from "./EndpointActions";

export const metadata: Metadata = { title: "Webhook endpoint" };

interface Props {
  params: Promise<{ id: string }>;
  searchParams: Promise<{ after?: string }>;
}

export default async function EndpointPage({ params, searchParams }: Props) {
  const member = await requireSignedIn();
  const [{ id }, { after }] = [await params, await searchParams];
  const reading = await readingOf(member);
  const row = await findEndpoint(reading, id).catch((error: unknown) => (error instanceof Problem ? null : Promise.reject(error)));
  if (!row) notFound();
  const endpoint = endpointOf(row);
  const { items, next } = await listDeliveries(reading, id, { limit: 25, after }).catch(() => ({ items: [], next: null }));
  const isDeveloper = member.organisation.role !== "viewer";
  return (
    <>
      <PageHeader title={endpoint.description ?? "Webhook endpoint"} back={{ href: "/webhooks", label: "Webhooks" }} facts={[{ label: "Id", value: endpoint.id }]} />
      <div className="grid grid-cols-[minmax(0,1fr)] gap-6">
        {endpoint.disabledReason && (
          <Notice kind="failure" title="Turned off">
            {endpoint.disabledReason} Mend the program behind it, then turn it on again.
          </Notice>
        )}
        <DefinitionList
          items={[
            { term: "Address", value: <span className="font-mono text-small break-all">{endpoint.url}</span> },
            { term: "Status", value: <EndpointStanding endpoint={endpoint} /> },
            { term: "Told of", value: endpoint.eventTypes.join(", ") },
            { term: "Made", value: <Time value={endpoint.createdAt} /> },
          ]}
        />
        {isDeveloper && <EndpointActions id={id} enabled={endpoint.enabled} url={endpoint.url} />}
        <section aria-labelledby="deliveries">
          <SectionHead id="deliveries">Deliveries</SectionHead>
          {items.length === 0 ? (
            <EmptyState title="Nothing was sent yet">The next event of a chosen type is.</EmptyState>
          ) : (
            <DeliveriesTable endpointId={id} deliveries={items} canRedeliver={isDeveloper && endpoint.enabled} />
          )}
          {next && (
            <div className="mt-4">
              <LinkButton href={`/webhooks/${id}?after=${next}`}>Older deliveries</LinkButton>
            </div>
          )}
        </section>
      </div>
    </>
  );
}
