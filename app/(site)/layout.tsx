import type { ReactNode } from "react";
import { SiteFooter } from "../_components/shell/SiteFooter";
import { SiteHeader } from "../_components/shell/SiteHeader";

/** Frame of the public pages. A page sets its own width inside. */
export default function SiteLayout({ children }: { children: ReactNode }) {
  return (
    <div className="flex min-h-dvh flex-col">
      <SiteHeader />
      <main id="page" tabIndex={-1} className="mx-auto w-full max-w-304 grow px-4 py-6 outline-none">
        {children}
      </main>
      <SiteFooter />
    </div>
  );
}
