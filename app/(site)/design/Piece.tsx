import type { ReactNode } from "react";

/** One piece on the page, under the name of its file. */
export function Piece({ name, children }: { name: string; children: ReactNode }) {
  return (
    <div className="min-w-0">
      <p className="mb-2 font-mono text-fine text-muted">{name}</p>
      {children}
    </div>
  );
}
