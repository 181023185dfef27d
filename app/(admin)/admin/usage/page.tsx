import type { Metadata } from "next";
import { BarChart } from "@/app/_components/data/BarChart";
import { DataTable } from "@/app/_components/data/DataTable";
import { formatNumber } from "@/app/_components/format/number";
import { Card } from "@/app/_components/layout/Card";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { requireAdministrator } from "@/app/_session";
import { usageOfAllByDay, usageOfAllByOperation } from "@/lib/usage/usageOfAll";
import { dayAgo } from "@/lib/usage/usageQuery";

export const metadata: Metadata = { title: "Usage over all accounts" };

export default async function AdminUsagePage() {
  await requireAdministrator();
  const [from, to] = [dayAgo(20), dayAgo(0)];
  const [days, operations] = await Promise.all([usageOfAllByDay(from, to), usageOfAllByOperation(from, to)]);
  return (
    <>
      <PageHeader title="Usage over all accounts">The last 21 days in UTC. Requests without a key, or with one that is on no record, are counted apart.</PageHeader>
      <div className="grid gap-5">
        <Card>
          <BarChart title="Requests by day" of="Day" unit="requests" series={["Answered", "Refused", "Unknown caller"]} bars={days.map(({ day, answered, refused, unknown }) => ({ label: day, values: [answered, refused, unknown] }))} />
        </Card>
        <Card title="By operation">
          <DataTable
            caption="Requests by operation"
            hideCaption
            columns={[
              { key: "operation", header: "Operation" },
              { key: "requests", header: "Requests", numeric: true },
              { key: "refused", header: "Refused", numeric: true },
              { key: "mean", header: "Mean, ms", numeric: true },
            ]}
            rows={operations.map((row) => ({
              id: row.operation,
              cells: { operation: row.operation, requests: row.requests, refused: row.refused, mean: { show: formatNumber(row.meanMicroseconds / 1_000, { decimals: 1 }), value: row.meanMicroseconds } },
            }))}
            sortedBy={{ key: "requests", descending: true }}
          />
        </Card>
      </div>
    </>
  );
}
