import type { ReactNode } from "react";

interface CardProps {
  /** A heading; without one the card is only a sheet. */
  title?: ReactNode;
  /** What stands at the right of the heading: a link, a count, a button. */
  aside?: ReactNode;
  /** Below a ruled line at the foot: buttons or a note. */
  foot?: ReactNode;
  /** Level of the heading. */
  level?: 2 | 3;
  /** No padding, for a table or a figure that reaches the edges. */
  flush?: boolean;
  id?: string;
  children: ReactNode;
}

/** A sheet on the paper: ruled head, body, ruled foot. */
export function Card({ title, aside, foot, level = 2, flush = false, id, children }: CardProps) {
  const Heading = level === 2 ? "h2" : "h3";
  return (
    <section id={id} className="min-w-0 border rounded-sheet bg-card">
      {(title !== undefined || aside !== undefined) && (
        <div className="flex flex-wrap items-center justify-between gap-x-4 gap-y-1 border-b px-4 py-2.5">
          {title !== undefined && <Heading className="font-semibold">{title}</Heading>}
          {aside !== undefined && <div className="text-small text-muted">{aside}</div>}
        </div>
      )}
      <div className={flush ? "" : "p-4"}>{children}</div>
      {foot !== undefined && <div className="border-t px-4 py-2.5">{foot}</div>}
    </section>
  );
}
