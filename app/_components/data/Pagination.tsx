import { LinkButton } from "../actions/LinkButton";

interface PaginationProps {
  /** Pages are found by a cursor, so there is a first and a next, and no numbers. */
  firstHref?: string;
  nextHref?: string;
  /** "50 requests". */
  shown?: string;
  /** Tells it from another on the same page. */
  label?: string;
}

/** The way through a list that comes page by page. */
export function Pagination({ firstHref, nextHref, shown, label = "Pages" }: PaginationProps) {
  return (
    <nav aria-label={label} className="flex flex-wrap items-center gap-2 py-3 text-small">
      {shown && <span className="mr-2 text-muted">{shown}</span>}
      {firstHref && (
        <LinkButton href={firstHref} size="small">
          First page
        </LinkButton>
      )}
      {nextHref && (
        <LinkButton href={nextHref} size="small" rel="next">
          Next page
        </LinkButton>
      )}
    </nav>
  );
}
