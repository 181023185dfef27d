import type { ReactNode } from "react";
import { NavDisclosure } from "./NavDisclosure";
import { NavLine, type NavGroup } from "./NavLine";
import { SkipLink } from "./SkipLink";
import { ThemeChoice } from "./ThemeChoice";
import { Wordmark } from "./Wordmark";

interface AppShellProps {
  /** Where one can go: groups of links, in order. */
  nav: NavGroup[];
  /** Whose pages these are: the organisation's name, or "Administration". */
  place: string;
  /** Who is signed in. */
  person: { name: string; email: string };
  /** In the top strip before the person: an environment switch, a badge. */
  aside?: ReactNode;
  /** The control that signs out: a form with a button. */
  signOut: ReactNode;
  children: ReactNode;
}

/** The frame of the portal and of the administration: a top strip, the pages on a line of points, the page. */
export function AppShell({ nav, place, person, aside, signOut, children }: AppShellProps) {
  return (
    <div className="flex min-h-dvh flex-col">
      <SkipLink />
      <header className="no-print border-b-2 border-b-ink bg-card">
        <div className="flex flex-wrap items-center gap-x-4 gap-y-1 px-4 py-2">
          <Wordmark />
          <p className="min-w-0 truncate border-l border-l-edge pl-4">{place}</p>
          <div className="ml-auto flex flex-wrap items-center gap-x-4 gap-y-1 text-small">
            {aside}
            <p title={person.email} className="max-w-56 truncate text-muted">
              {person.name}
            </p>
            {signOut}
          </div>
        </div>
      </header>
      <div className="flex grow flex-col md:flex-row">
        <aside aria-label="Pages and appearance" className="no-print border-b bg-card md:w-52 md:shrink-0 md:border-r md:border-b-0">
          <NavDisclosure>
            <nav aria-label={place} className="px-4 py-3">
              <NavLine groups={nav} />
            </nav>
            <div className="border-t px-4 py-3">
              <ThemeChoice />
            </div>
          </NavDisclosure>
        </aside>
        <main id="page" tabIndex={-1} className="min-w-0 max-w-280 grow px-4 py-5 outline-none md:px-8">
          {children}
        </main>
      </div>
    </div>
  );
}
