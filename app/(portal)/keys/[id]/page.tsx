import type { Metadata } from "next";
import Link from "next/link";
import { notFound } from "next/navigation";
import { DataTable } from "@/app/_components/data/DataTable";
import { DefinitionList } from "@/app/_components/data/DefinitionList";
import { Time } from "@/app/_components/format/Time";
import { Badge } from "@/app/_components/layout/Badge";
import { Card } from "@/app/_components/layout/Card";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { EmptyState } from "@/app/_components/mark/EmptyState";
import { requireSignedIn } from "@/app/_session";
import { findKeySummary } from "@/lib/keys/listKeys";
import { config } from "@/lib/runtime/config";
import { usageByOperation } from "@/lib/usage/usageByOperation";
import { dayAgo } from "@/lib/usage/usageQuery";
import { KeyStanding } from "../KeyStanding";
import { KeyActions } from "./KeyActions";

export const metadata: Metadata = { title: "Key" };

const COLUMNS = [
  { key: "operation", header: "Operation" },
  { key: "requests", header: "Requests", numeric: true },
  { key: "refused", header: "Refused", numeric: true },
];

export default async function KeyPage({ params }: { params: Promise<{ id: string }> }) {
  const { organisation } = await requireSignedIn();
  const { id } = await params;
  const key = await findKeySummary(organisation.id, id);
  if (!key) notFound();
  const operations = await usageByOperation({ organisationId: organisation.id, from: dayAgo(20), to: dayAgo(0), keyId: id });
  return (
    <>
      <PageHeader title={key.name} back={{ href: "/keys", label: "Keys" }} facts={[{ label: "Environment", value: key.environment }, { label: "Ends in", value: `…${key.ending}` }, { label: "Id", value: key.id }]} />
      <div className="grid gap-5">
        <DefinitionList
          items={[
            { term: "Status", value: <KeyStanding status={key.status} expiresAt={key.expiresAt} isReplaced={key.replacedBy !== null} /> },
            { term: "Scopes", value: <span className="flex flex-wrap gap-1.5">{key.scopes.map((scope) => <Badge key={scope}>{scope}</Badge>)}</span> },
            { term: "Allowed networks", value: key.allowedNetworks?.join(", ") ?? "From everywhere" },
            { term: "Made", value: <><Time value={key.createdAt} /> by {key.createdBy ?? "the command line"}</> },
            { term: "Last used", value: key.lastUsedAt ? <><Time value={key.lastUsedAt} /> from {key.lastUsedFrom}</> : "Never" },
            ...(key.replacedBy ? [{ term: "Replaced by", value: <Link href={`/keys/${key.replacedBy}`} className="link">its successor</Link> }] : []),
          ]}
        />
        <Card title="Used for, last 21 days" flush>
          <div className="p-4">
            <DataTable
              caption="Operations called with this key"
              hideCaption
              columns={COLUMNS}
              rows={operations.map(({ operation, requests, refused }) => ({ id: operation, cells: { operation, requests, refused } }))}
              empty={<EmptyState title="Not used in this time" />}
            />
          </div>
        </Card>
        {organisation.role !== "viewer" && key.status === "active" && (
          <KeyActions
            id={key.id}
            name={key.name}
            canRotate={key.replacedBy === null}
            baseUrl={config().AVERDUCT_URL}
            lastUse={key.lastUsedAt ? `It was last used at ${key.lastUsedAt.toISOString().slice(0, 16).replace("T", " ")} UTC from ${key.lastUsedFrom}${operations.length > 0 ? `, for ${operations.map(({ operation }) => operation).join(", ")}` : ""}.` : "It has never been used."}
          />
        )}
      </div>
    </>
  );
}
