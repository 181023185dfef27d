import type { ReactNode } from "react";
import Link from "next/link";

const PAGES = [
  { href: "/docs", label: "First call" },
  { href: "/docs/units", label: "Units" },
  { href: "/docs/problems", label: "Problems" },
  { href: "/docs/cautions", label: "Cautions" },
  { href: "/docs/changelog", label: "Changelog" },
  { href: "/docs/reference", label: "API reference" },
];

export default function DocsLayout({ children }: { children: ReactNode }) {
  return (
    <div className="grid gap-6">
      <nav aria-label="Docs" className="border-b pb-2">
        <ul className="flex flex-wrap gap-x-5 gap-y-1">
          {PAGES.map(({ href, label }) => (
            <li key={href}>
              <Link href={href} className="link">
                {label}
              </Link>
            </li>
          ))}
        </ul>
      </nav>
      <div className="min-w-0">{children}</div>
    </div>
  );
}
