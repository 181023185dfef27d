import type { ReactNode } from "react";

/** Figures side by side in ruled cells; each child is a cell. They wrap where it is narrow. */
export function StatRow({ children }: { children: ReactNode }) {
  return (
    <div className="grid grid-cols-[repeat(auto-fit,minmax(min(10rem,100%),1fr))] overflow-hidden border rounded-sheet bg-card [&>*]:px-4 [&>*]:py-3 [&>*]:shadow-[1px_1px_0_0_var(--rule)]">
      {children}
    </div>
  );
}
