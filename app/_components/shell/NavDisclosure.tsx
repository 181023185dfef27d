"use client";

import { usePathname } from "next/navigation";
import { useState, type ReactNode } from "react";

/** Opens and shuts its content where the page is narrow; where it is wide the content simply stands. */
export function NavDisclosure({ children }: { children: ReactNode }) {
  const path = usePathname();
  // Remembers the page it was opened on, so that going to another shuts it.
  const [openOn, setOpenOn] = useState<string | null>(null);
  const open = openOn === path;
  return (
    <>
      <button
        type="button"
        aria-expanded={open}
        aria-controls="pages"
        onClick={() => setOpenOn(open ? null : path)}
        className="flex min-h-11 w-full items-center justify-between px-4 text-small font-medium md:hidden"
      >
        Pages
        <svg viewBox="0 0 10 6" width="12" height="8" aria-hidden fill="none" stroke="currentColor" strokeWidth="1.5" className={open ? "rotate-180" : ""}>
          <path d="M1 1l4 4 4-4" />
        </svg>
      </button>
      <div id="pages" className={`${open ? "block border-t" : "hidden"} md:sticky md:top-0 md:block md:border-t-0`}>
        {children}
      </div>
    </>
  );
}
