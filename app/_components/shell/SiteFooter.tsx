import Link from "next/link";
import type { ReactNode } from "react";
import { Mark } from "../mark/Mark";
import { ThemeChoice } from "./ThemeChoice";

const LINKS = [
  { href: "/docs", label: "Docs" },
  { href: "/docs/reference", label: "API reference" },
  { href: "/docs/cautions", label: "Cautions" },
  { href: "/docs/changelog", label: "Changelog" },
];

/** Foot of the public pages: the title block of the sheet. */
export function SiteFooter() {
  return (
    <footer className="no-print mx-auto mt-12 w-full max-w-304 px-4 pb-8">
      <div className="grid border-2 border-ink rounded-sheet bg-card text-small lg:grid-cols-[11rem_1fr_16rem]">
        <Cell>
          <p className="flex items-center gap-2 font-semibold">
            <Mark size={20} className="text-action" />
            Averduct
          </p>
          <p className="text-muted">API version 1</p>
        </Cell>
        <Cell>
          <p className="max-w-2xl text-muted">
            Results support, and do not replace, local codes, the project specification and licensed or certified practice. Smoke control and laboratory
            containment need the responsible professional.
          </p>
          <ul className="mt-1.5 flex flex-wrap gap-x-4 gap-y-1">
            {LINKS.map(({ href, label }) => (
              <li key={href}>
                <Link href={href} prefetch={false} className="link">
                  {label}
                </Link>
              </li>
            ))}
          </ul>
        </Cell>
        <Cell>
          <ThemeChoice />
        </Cell>
      </div>
    </footer>
  );
}

function Cell({ children }: { children: ReactNode }) {
  return <div className="border-b px-3.5 py-2.5 last:border-b-0 lg:border-r lg:border-b-0 lg:last:border-r-0">{children}</div>;
}
