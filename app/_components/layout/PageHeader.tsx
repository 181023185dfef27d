import Link from "next/link";
import type { ReactNode } from "react";

interface PageHeaderProps {
  title: string;
  /** One sentence: what the page is for. */
  children?: ReactNode;
  /** Facts of the page, as in the title block of a drawing: environment, plan, revision. */
  facts?: { label: string; value: ReactNode }[];
  /** Buttons. */
  actions?: ReactNode;
  /** The page above. */
  back?: { href: string; label: string };
}

/** The title block of a page: its name, what it is for, and its facts in ruled cells. */
export function PageHeader({ title, children, facts = [], actions, back }: PageHeaderProps) {
  return (
    <header className="mb-6 border-y-2 border-y-ink">
      <div className="flex flex-wrap items-start justify-between gap-x-6 gap-y-3 py-3">
        <div className="min-w-0">
          {back && (
            <p className="mb-1 text-small">
              <Link href={back.href} className="link">
                <span aria-hidden>← </span>
                {back.label}
              </Link>
            </p>
          )}
          <h1 className="text-head font-semibold">{title}</h1>
          {children && <div className="mt-1 max-w-2xl text-muted">{children}</div>}
        </div>
        {actions && <div className="no-print flex flex-wrap gap-2 pt-0.5">{actions}</div>}
      </div>
      {facts.length > 0 && (
        <dl className="flex flex-wrap border-t">
          {facts.map(({ label, value }) => (
            <div key={label} className="min-w-32 grow border-r py-1.5 pr-4 pl-3 first:pl-0 last:border-r-0 sm:grow-0">
              <dt className="text-fine text-muted">{label}</dt>
              <dd className="font-mono text-small">{value}</dd>
            </div>
          ))}
        </dl>
      )}
    </header>
  );
}
