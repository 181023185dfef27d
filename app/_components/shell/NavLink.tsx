"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";
import type { ReactNode } from "react";

interface NavLinkProps {
  href: string;
  /** Current only on this very address, not on those below it. */
  exact?: boolean;
  className: string;
  children: ReactNode;
}

/** A link that knows whether its page is the one being read (`aria-current`). */
export function NavLink({ href, exact = false, className, children }: NavLinkProps) {
  const path = usePathname();
  const current = path === href || (!exact && path.startsWith(`${href}/`));
  return (
    <Link href={href} aria-current={current ? "page" : undefined} className={className}>
      {children}
    </Link>
  );
}
