import { Mark } from "@/app/_components/mark/Mark";
import type { TraverseSummary } from "@/lib/records/traverses/answer";

/** A traverse no larger than a stamp; the mark where nothing was read yet. The words beside it say what it is. */
export function Thumbnail({ item: { id, airflow }, className = "w-24" }: { item: TraverseSummary; className?: string }) {
  if (airflow === null) {
    return (
      <span className={`flex aspect-4/3 items-center justify-center text-edge ${className}`}>
        <Mark />
      </span>
    );
  }
  // As an image of its own it has the colours of paper, whatever the page's are.
  return <img src={`/api/portal/records/${id}/thumbnail.svg`} alt="" loading="lazy" width={96} height={72} className={`aspect-4/3 h-auto rounded-control bg-[#fff] p-0.5 ${className}`} />;
}
