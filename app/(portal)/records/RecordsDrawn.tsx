import Link from "next/link";
import { formatQuantity } from "@/app/_components/format/number";
import { RecordStanding } from "@/app/_components/records/RecordStanding";
import type { TraverseSummary } from "@/lib/records/traverses/answer";
import { Thumbnail } from "./Thumbnail";

/** Traverses as drawings, for those who would rather look than read. */
export function RecordsDrawn({ items }: { items: TraverseSummary[] }) {
  return (
    <ul className="grid grid-cols-2 gap-4 sm:grid-cols-3 lg:grid-cols-5">
      {items.map((item) => (
        <li key={item.id} className="min-w-0 border bg-card p-2">
          <Link href={`/records/${item.id}`} className="block">
            <Thumbnail item={item} className="w-full" />
            <span className="mt-2 block truncate font-medium">{item.system ?? "No system"}</span>
            <span className="block truncate text-small text-muted">{item.location ?? "–"}</span>
          </Link>
          <p className="mt-1 flex flex-wrap justify-between gap-x-2 text-small">
            <span className="font-mono">{item.airflow ? formatQuantity(item.airflow, { decimals: 0 }) : "–"}</span>
            <RecordStanding status={item.status} />
          </p>
        </li>
      ))}
    </ul>
  );
}
