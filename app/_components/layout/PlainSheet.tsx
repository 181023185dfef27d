import type { ReactNode } from "react";
import { Wordmark } from "../shell/Wordmark";

interface PlainSheetProps {
  title: string;
  /** At the right of the title: a status or a reference. */
  code?: string;
  children: ReactNode;
}

/** A page by itself, without navigation: what went wrong, or one short form such as signing in. */
export function PlainSheet({ title, code, children }: PlainSheetProps) {
  return (
    <main id="page" className="mx-auto grid w-full max-w-128 gap-5 px-4 py-10 sm:py-16">
      <Wordmark />
      <div className="border-2 border-ink rounded-sheet bg-card">
        <div className="flex items-baseline justify-between gap-4 border-b px-5 py-3">
          <h1 className="text-title font-semibold">{title}</h1>
          {code && <p className="font-mono text-small text-muted">{code}</p>}
        </div>
        <div className="px-5 py-4">{children}</div>
      </div>
    </main>
  );
}
