import { NavLink } from "./NavLink";

export interface NavGroup {
  heading?: string;
  items: { href: string; label: string; exact?: boolean }[];
}

/** Links as the points of a traverse line: a point for each page, the open one where the reader is. */
export function NavLine({ groups }: { groups: NavGroup[] }) {
  return (
    <div className="grid gap-4">
      {groups.map(({ heading, items }, index) => (
        <div key={heading ?? index}>
          {heading && <p className="mb-1 text-fine text-muted">{heading}</p>}
          <ul className="relative before:absolute before:inset-y-3.5 before:left-[5px] before:w-px before:bg-edge">
            {items.map(({ href, label, exact }) => (
              <li key={href}>
                <NavLink
                  href={href}
                  exact={exact}
                  className="group relative flex min-h-7.5 items-center gap-3 rounded-control pr-2 text-small hover:bg-inset aria-[current=page]:font-semibold"
                >
                  <span
                    aria-hidden
                    className="relative size-[11px] shrink-0 rounded-full border-[3px] border-card bg-edge group-hover:bg-ink group-aria-[current=page]:border-2 group-aria-[current=page]:border-action group-aria-[current=page]:bg-card"
                  />
                  {label}
                </NavLink>
              </li>
            ))}
          </ul>
        </div>
      ))}
    </div>
  );
}
