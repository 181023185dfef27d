import { NavLink } from "./NavLink";
import { SkipLink } from "./SkipLink";
import { Wordmark } from "./Wordmark";

interface SiteHeaderProps {
  /** Shows the way to the portal in place of signing in. */
  signedIn?: boolean;
}

const PLACES = [
  { href: "/docs", label: "Docs", exact: false },
  { href: "/docs/reference", label: "API reference", exact: true },
];
const STRANGER = [
  { href: "/sign-in", label: "Sign in" },
  { href: "/sign-up", label: "Create an account" },
];
const MEMBER = [{ href: "/overview", label: "Portal" }];

const CELL =
  "flex min-h-11 items-center border-l px-2 text-small whitespace-nowrap sm:px-3.5 hover:bg-inset aria-[current=page]:font-semibold aria-[current=page]:shadow-[inset_0_-2px_0_var(--action)]";

/** Head of the public pages: ruled cells, as along the edge of a drawing. */
export function SiteHeader({ signedIn = false }: SiteHeaderProps) {
  return (
    <header className="no-print border-b-2 border-b-ink bg-card">
      <SkipLink />
      <div className="mx-auto flex max-w-304 flex-wrap items-stretch justify-between">
        <div className="flex min-h-11 items-center px-4">
          <Wordmark />
        </div>
        <nav aria-label="Site" className="flex grow border-t sm:grow-0 sm:border-t-0 sm:border-r [&>a:first-child]:border-l-0 sm:[&>a:first-child]:border-l">
          {PLACES.map(({ href, label, exact }) => (
            <NavLink key={href} href={href} exact={exact} className={CELL}>
              {label}
            </NavLink>
          ))}
          {(signedIn ? MEMBER : STRANGER).map(({ href, label }) => (
            <NavLink key={href} href={href} className={CELL}>
              {label}
            </NavLink>
          ))}
        </nav>
      </div>
    </header>
  );
}
