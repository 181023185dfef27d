import type { Metadata } from "next";
import { DataTable, type Row } from "@/app/_components/data/DataTable";
import { formatShare } from "@/app/_components/format/number";
import { Time } from "@/app/_components/format/Time";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { Status } from "@/app/_components/layout/Status";
import { requireAdministrator } from "@/app/_session";
import { listAccounts, type AccountSummary } from "@/lib/accounts/admin/listAccounts";

export const metadata: Metadata = { title: "Accounts" };

const COLUMNS = [
  { key: "name", header: "Organisation" },
  { key: "plan", header: "Plan" },
  { key: "members", header: "Members", numeric: true },
  { key: "keys", header: "Keys", numeric: true },
  { key: "production", header: "Production", numeric: true },
  { key: "sandbox", header: "Sandbox", numeric: true },
  { key: "quota", header: "Of quota", numeric: true },
  { key: "refused", header: "Refused", numeric: true },
  { key: "last", header: "Last request" },
  { key: "status", header: "Status" },
];

function toRow(account: AccountSummary): Row {
  const requests = account.production + account.sandbox;
  const quota = account.production / account.monthlyRequests;
  const refused = requests ? account.refused / requests : 0;
  return {
    id: account.id,
    cells: {
      name: account.name,
      plan: account.plan,
      members: account.members,
      keys: account.keys,
      production: account.production,
      sandbox: account.sandbox,
      quota: { show: formatShare(quota), value: quota },
      refused: { show: formatShare(refused), value: refused },
      last: { show: <Time value={account.lastRequestAt} absent="never" />, value: account.lastRequestAt?.getTime() ?? null },
      status: account.suspendedAt ? { show: <Status standing="failure">Suspended</Status>, value: "suspended" } : { show: <Status standing="good">Active</Status>, value: "active" },
    },
  };
}

export default async function AccountsPage() {
  await requireAdministrator();
  const accounts = await listAccounts();
  return (
    <>
      <PageHeader title="Accounts">Every organisation, with its requests of the current month (UTC).</PageHeader>
      <DataTable caption="Accounts" hideCaption columns={COLUMNS} rows={accounts.map(toRow)} filter="Find an account" sortedBy={{ key: "production", descending: true }} />
    </>
  );
}
