import type { Metadata } from "next";
import Link from "next/link";
import { LinkButton } from "@/app/_components/actions/LinkButton";
import { CodeBlock } from "@/app/_components/code/CodeBlock";
import { Sparkline } from "@/app/_components/data/Sparkline";
import { Stat } from "@/app/_components/data/Stat";
import { StatRow } from "@/app/_components/data/StatRow";
import { formatNumber, formatShare } from "@/app/_components/format/number";
import { Time } from "@/app/_components/format/Time";
import { Card } from "@/app/_components/layout/Card";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { EmptyState } from "@/app/_components/mark/EmptyState";
import { requireSignedIn } from "@/app/_session";
import { planOf } from "@/lib/accounts/plan";
import { listKeys } from "@/lib/keys/listKeys";
import { config } from "@/lib/runtime/config";
import { quotaBurn } from "@/lib/usage/quotaBurn";
import { usageByDay } from "@/lib/usage/usageByDay";
import { dayAgo } from "@/lib/usage/usageQuery";
import { firstCallSamples } from "../firstCall";

export const metadata: Metadata = { title: "Overview" };

export default async function OverviewPage() {
  const { organisation } = await requireSignedIn();
  const [plan, keys, burn, days] = await Promise.all([
    planOf(organisation.planId),
    listKeys(organisation.id),
    quotaBurn(organisation.id),
    usageByDay({ organisationId: organisation.id, from: dayAgo(20), to: dayAgo(0) }),
  ]);
  const active = keys.filter(({ status }) => status === "active");
  const requests = days.reduce((sum, day) => sum + day.succeeded + day.refused, 0);
  const refused = days.reduce((sum, day) => sum + day.refused, 0);
  return (
    <>
      <PageHeader
        title="Overview"
        facts={[
          { label: "Plan", value: plan.name },
          { label: "Limit", value: `${formatNumber(plan.requestsPerSecond)} a second` },
          { label: "Quota", value: `${formatNumber(plan.monthlyRequests)} a month` },
          { label: "Your role", value: organisation.role },
        ]}
      />
      <div className="grid gap-5">
        <StatRow>
          <Stat label="Calculations in production, this month" value={formatNumber(burn.production)} share={burn.production / plan.monthlyRequests} note={`${formatShare(burn.production / plan.monthlyRequests)} of the quota`} />
          <Stat label="Calculations in the sandbox, this month" value={formatNumber(burn.sandbox)} share={burn.sandbox / plan.monthlyRequests} note={`${formatShare(burn.sandbox / plan.monthlyRequests)} of the quota`} />
          <Stat
            label="Requests, last 21 days"
            value={formatNumber(requests)}
            note={<Sparkline values={days.map((day) => day.succeeded + day.refused)} label="Requests a day, last 21 days" />}
          />
          <Stat label="Refused, last 21 days" value={requests ? formatShare(refused / requests) : "–"} note={<Link href="/usage" className="link">See the usage</Link>} />
        </StatRow>
        <Card title="A first call" aside={active.length > 0 ? "Put a key into AVERDUCT_KEY" : undefined}>
          {active.length === 0 ? (
            <EmptyState title="No key yet" action={organisation.role !== "viewer" && <LinkButton href="/keys/new" variant="primary">Make a key</LinkButton>}>
              A key lets a program call the API. A sandbox key is the one to begin with.
            </EmptyState>
          ) : (
            <CodeBlock title="Request" hideTitle samples={firstCallSamples(config().AVERDUCT_URL)} />
          )}
        </Card>
        {active.length > 0 && (
          <Card title="Keys in use" aside={<Link href="/keys" className="link">All keys</Link>}>
            <ul className="grid gap-1">
              {active.slice(0, 6).map((key) => (
                <li key={key.id} className="flex flex-wrap justify-between gap-x-4">
                  <Link href={`/keys/${key.id}`} className="link">{key.name}</Link>
                  <span className="text-small text-muted">
                    {key.environment}, last used <Time value={key.lastUsedAt} absent="never" />
                  </span>
                </li>
              ))}
            </ul>
          </Card>
        )}
      </div>
    </>
  );
}
