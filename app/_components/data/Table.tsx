import type { ReactNode } from "react";

interface TableProps {
  /** What the table holds: read out, and shown above unless hidden. */
  caption: string;
  hideCaption?: boolean;
  /** `thead` and `tbody`. Cells that hold figures take the class `numeric`. */
  children: ReactNode;
}

/** A ruled table. Where it is wider than its place it scrolls by itself, never the page. */
export function Table({ caption, hideCaption = false, children }: TableProps) {
  return (
    <div role="region" aria-label={caption} tabIndex={0} className="max-w-full overflow-x-auto">
      <table className="ruled">
        <caption className={hideCaption ? "sr-only" : "pb-1.5 text-left font-semibold text-ink"}>{caption}</caption>
        {children}
      </table>
    </div>
  );
}
