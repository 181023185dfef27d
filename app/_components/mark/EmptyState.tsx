import type { ReactNode } from "react";
import { Mark } from "./Mark";

interface EmptyStateProps {
  /** What is not there: "No keys yet". */
  title: string;
  /** What would put something there. */
  children?: ReactNode;
  /** A button or a link that does it. */
  action?: ReactNode;
}

/** Stands where a list would, when the list has nothing in it. */
export function EmptyState({ title, children, action }: EmptyStateProps) {
  return (
    <div className="flex flex-col items-start gap-3 border border-dashed border-edge rounded-sheet px-5 py-6 sm:flex-row sm:gap-5">
      <Mark state="empty" size={44} className="shrink-0 text-muted" />
      <div className="min-w-0">
        <p className="font-semibold">{title}</p>
        {children && <div className="mt-1 max-w-xl text-muted">{children}</div>}
        {action && <div className="mt-4">{action}</div>}
      </div>
    </div>
  );
}
