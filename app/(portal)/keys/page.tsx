import type { Metadata } from "next";
import Link from "next/link";
import { LinkButton } from "@/app/_components/actions/LinkButton";
import { DataTable, type Row } from "@/app/_components/data/DataTable";
import { Time } from "@/app/_components/format/Time";
import { Badge } from "@/app/_components/layout/Badge";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { EmptyState } from "@/app/_components/mark/EmptyState";
import { requireSignedIn } from "@/app/_session";
import { listKeys, type KeySummary } from "@/lib/keys/listKeys";
import { KeyStanding } from "./KeyStanding";

export const metadata: Metadata = { title: "Keys" };

const COLUMNS = [
  { key: "name", header: "Name" },
  { key: "environment", header: "Environment" },
  { key: "status", header: "Status" },
  { key: "ending", header: "Ends in", sortable: false },
  { key: "used", header: "Last used" },
  { key: "created", header: "Made" },
];

const timeCell = (value: Date | null, absent: string) => ({ show: <Time value={value} absent={absent} />, value: value?.getTime() ?? null });

const toRow = (key: KeySummary): Row => ({
  id: key.id,
  cells: {
    name: { show: <Link href={`/keys/${key.id}`} className="link">{key.name}</Link>, value: key.name },
    environment: { show: <Badge>{key.environment}</Badge>, value: key.environment },
    status: { show: <KeyStanding status={key.status} expiresAt={key.expiresAt} isReplaced={key.replacedBy !== null} />, value: key.status },
    ending: { show: <span className="font-mono text-small">…{key.ending}</span>, value: key.ending },
    used: timeCell(key.lastUsedAt, "never"),
    created: timeCell(key.createdAt, "–"),
  },
});

export default async function KeysPage() {
  const { organisation } = await requireSignedIn();
  const keys = await listKeys(organisation.id);
  const make = organisation.role === "viewer" ? null : <LinkButton href="/keys/new" variant="primary">Make a key</LinkButton>;
  return (
    <>
      <PageHeader title="Keys" actions={make}>
        A key lets a program call the API for {organisation.name}, in one environment and within its scopes.
      </PageHeader>
      <DataTable
        caption="Keys"
        hideCaption
        columns={COLUMNS}
        rows={keys.map(toRow)}
        filter="Find a key"
        sortedBy={{ key: "created", descending: true }}
        empty={<EmptyState title="No keys yet" action={make}>A sandbox key is the one to begin with: its records never mix with production&apos;s.</EmptyState>}
      />
    </>
  );
}
