import type { ReactNode } from "react";

/** A word that classes a thing: an environment, a scope, a role. Says nothing about how it stands; see Status. */
export function Badge({ children }: { children: ReactNode }) {
  return <span className="inline-block whitespace-nowrap border border-edge rounded-control bg-card px-1.5 font-mono text-fine leading-5 text-ink">{children}</span>;
}
