import type { ReactNode } from "react";

interface TableProps {
  /** What the table holds: read out, and shown above unless hidden. */
  caption: string;
  hideCaption?: boolean;
  /** CSS length above which the rows scroll below a head that stays. */
  maxHeight?: string;
  /** `thead` and `tbody`. Cells that hold figures take the class `numeric`. */
  children: ReactNode;
}

const FIXED_HEAD = "[&_thead_th]:sticky [&_thead_th]:top-0 [&_thead_th]:bg-card [&_thead_th]:shadow-[inset_0_-1px_0_var(--ink)]";

/** A ruled table. Where it is wider than its place it scrolls by itself, never the page. */
export function Table({ caption, hideCaption = false, maxHeight, children }: TableProps) {
  return (
    <div role="region" aria-label={caption} tabIndex={0} style={{ maxHeight }} className={`relative max-w-full overflow-auto ${maxHeight ? FIXED_HEAD : ""}`}>
      <table className="ruled">
        <caption className={hideCaption ? "sr-only" : "pb-1.5 text-left font-semibold text-ink"}>{caption}</caption>
        {children}
      </table>
    </div>
  );
}
