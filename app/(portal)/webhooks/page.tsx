import type { Metadata } from "next";
import Link from "next/link";
import { LinkButton } from "@/app/_components/actions/LinkButton";
import { DataTable, type Row } from "@/app/_components/data/DataTable";
import { Time } from "@/app/_components/format/Time";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { EmptyState } from "@/app/_components/mark/EmptyState";
import { readingOf } from "@/app/_realm";
import { requireSignedIn } from "@/app/_session";
import { listEndpoints, type WebhookEndpoint } from "@/lib/webhooks/endpoints";
import { EndpointStanding } from "./EndpointStanding";

export const metadata: Metadata = { title: "Webhooks" };

const COLUMNS = [
  { key: "url", header: "Address" },
  { key: "types", header: "Told of" },
  { key: "status", header: "Status" },
  { key: "made", header: "Made" },
];

const toRow = (endpoint: WebhookEndpoint): Row => ({
  id: endpoint.id,
  cells: {
    url: { show: <Link href={`/webhooks/${endpoint.id}`} className="link break-all">{endpoint.url}</Link>, value: endpoint.url },
    types: endpoint.eventTypes.join(", "),
    status: { show: <EndpointStanding endpoint={endpoint} />, value: endpoint.enabled ? 1 : 0 },
    made: { show: <Time value={endpoint.createdAt} />, value: endpoint.createdAt },
  },
});

export default async function WebhooksPage() {
  const member = await requireSignedIn();
  // No environment has more endpoints than fit on a page.
  const { items } = await listEndpoints(await readingOf(member), { limit: 200 });
  const make = member.organisation.role === "viewer" ? null : <LinkButton href="/webhooks/new" variant="primary">Make an endpoint</LinkButton>;
  return (
    <>
      <PageHeader title="Webhooks" actions={make}>
        Addresses of your programs that are told when something happens to a record. Every delivery is signed, and tried for three days.
      </PageHeader>
      <DataTable
        caption="Webhook endpoints"
        hideCaption
        columns={COLUMNS}
        rows={items.map(toRow)}
        empty={<EmptyState title="No endpoints yet" action={make}>Without one, a program asks for new events itself: GET /events has the last 90 days.</EmptyState>}
      />
    </>
  );
}
