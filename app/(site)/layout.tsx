import type { ReactNode } from "react";
import { signedIn } from "../_session";
import { SiteFooter } from "../_components/shell/SiteFooter";
import { SiteHeader } from "../_components/shell/SiteHeader";

/** Frame of the public pages. A page sets its own width inside. */
export default async function SiteLayout({ children }: { children: ReactNode }) {
  // The public pages stay up while the database is away; nobody is then signed in.
  const person = await signedIn().catch(() => null);
  return (
    <div className="flex min-h-dvh flex-col">
      <SiteHeader signedIn={person !== null} />
      <main id="page" tabIndex={-1} className="mx-auto w-full max-w-304 grow px-4 py-6 outline-none">
        {children}
      </main>
      <SiteFooter />
    </div>
  );
}
