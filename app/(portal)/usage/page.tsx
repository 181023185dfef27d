import type { Metadata } from "next";
import { Button } from "@/app/_components/actions/Button";
import { LinkButton } from "@/app/_components/actions/LinkButton";
import { BarChart } from "@/app/_components/data/BarChart";
import { DataTable } from "@/app/_components/data/DataTable";
import { Select } from "@/app/_components/forms/Select";
import { TextInput } from "@/app/_components/forms/TextInput";
import { formatNumber, formatShare } from "@/app/_components/format/number";
import { Stat } from "@/app/_components/data/Stat";
import { StatRow } from "@/app/_components/data/StatRow";
import { Card } from "@/app/_components/layout/Card";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { requireSignedIn } from "@/app/_session";
import { listKeys } from "@/lib/keys/listKeys";
import { usageByDay } from "@/lib/usage/usageByDay";
import { usageByOperation } from "@/lib/usage/usageByOperation";
import { usageByStatus } from "@/lib/usage/usageByStatus";
import { usageFilter } from "./filter";

export const metadata: Metadata = { title: "Usage" };

const OPERATION_COLUMNS = [
  { key: "operation", header: "Operation" },
  { key: "requests", header: "Requests", numeric: true },
  { key: "refused", header: "Refused", numeric: true },
  { key: "items", header: "Calculations", numeric: true },
  { key: "mean", header: "Mean, ms", numeric: true },
  { key: "slowest", header: "Slowest, ms", numeric: true },
];

const milliseconds = (microseconds: number) => ({ show: formatNumber(microseconds / 1_000, { decimals: 1 }), value: microseconds });

export default async function UsagePage({ searchParams }: { searchParams: Promise<Record<string, string | string[] | undefined>> }) {
  const { organisation } = await requireSignedIn();
  const filter = usageFilter(organisation.id, await searchParams);
  const [days, operations, statuses, keys] = await Promise.all([usageByDay(filter), usageByOperation(filter), usageByStatus(filter), listKeys(organisation.id)]);
  const requests = statuses.reduce((sum, status) => sum + status.requests, 0);
  const refused = statuses.reduce((sum, { status, requests: count }) => sum + (status >= 400 ? count : 0), 0);
  const { from, to, environment, keyId } = filter;
  const download = new URLSearchParams({ from, to, ...(environment && { environment }), ...(keyId && { key: keyId }) });
  return (
    <>
      <PageHeader title="Usage" actions={<LinkButton href={`/api/portal/usage.csv?${download}`} prefetch={false} download>Download CSV</LinkButton>}>
        Every request with a key of {organisation.name}, the refused ones included. Days are in UTC.
      </PageHeader>
      <form method="get" className="mb-5 grid items-end gap-3 sm:grid-cols-2 lg:grid-cols-[repeat(4,minmax(0,1fr))_auto]">
        <TextInput name="from" type="date" label="From" defaultValue={from} max={to} />
        <TextInput name="to" type="date" label="To" defaultValue={to} />
        <Select name="environment" label="Environment" defaultValue={environment ?? ""} choices={[{ value: "", label: "Both" }, { value: "sandbox", label: "Sandbox" }, { value: "production", label: "Production" }]} />
        <Select name="key" label="Key" defaultValue={keyId ?? ""} choices={[{ value: "", label: "All keys" }, ...keys.map(({ id, name, ending }) => ({ value: id, label: `${name} …${ending}` }))]} />
        <Button type="submit">Show</Button>
      </form>
      <div className="grid gap-5">
        <StatRow>
          <Stat label="Requests" value={formatNumber(requests)} />
          <Stat label="Refused" value={formatNumber(refused)} note={requests ? formatShare(refused / requests) : undefined} />
          <Stat label="Calculations" value={formatNumber(days.reduce((sum, { items }) => sum + items, 0))} note="Items of batches counted singly" />
        </StatRow>
        <Card>
          <BarChart title="Requests by day" of="Day" unit="requests" series={["Answered", "Refused"]} bars={days.map(({ day, succeeded, refused: failed }) => ({ label: day, values: [succeeded, failed] }))} />
        </Card>
        <Card>
          <BarChart title="Requests by operation" of="Operation" unit="requests" series={["Answered", "Refused"]} bars={operations.map((row) => ({ label: row.operation, values: [row.requests - row.refused, row.refused] }))} />
        </Card>
        <Card title="Operations">
          <DataTable
            caption="Operations"
            hideCaption
            columns={OPERATION_COLUMNS}
            rows={operations.map((row) => ({
              id: row.operation,
              cells: { operation: row.operation, requests: row.requests, refused: row.refused, items: row.items, mean: milliseconds(row.meanMicroseconds), slowest: milliseconds(row.slowestMicroseconds) },
            }))}
            sortedBy={{ key: "requests", descending: true }}
          />
        </Card>
        <Card title="Answers by status">
          <DataTable
            caption="Answers by status"
            hideCaption
            columns={[{ key: "status", header: "Status" }, { key: "requests", header: "Requests", numeric: true }, { key: "share", header: "Share", numeric: true }]}
            rows={statuses.map(({ status, requests: count }) => ({ id: String(status), cells: { status, requests: count, share: { show: formatShare(count / requests), value: count } } }))}
          />
        </Card>
      </div>
    </>
  );
}
