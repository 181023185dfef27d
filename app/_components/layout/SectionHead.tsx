import type { ReactNode } from "react";
import { DimensionLine } from "../figures/DimensionLine";

interface SectionHeadProps {
  children: ReactNode;
  /** What the section measures: "10 operations", "25 readings". */
  measure?: ReactNode;
  id?: string;
}

/** Heading of a section, with a dimension line to the margin that says how much is in it. */
export function SectionHead({ children, measure, id }: SectionHeadProps) {
  return (
    <div className="mb-3 flex flex-wrap items-center gap-x-4">
      <h2 id={id} className="text-title font-semibold">
        {children}
      </h2>
      {measure !== undefined && <DimensionLine className="min-w-40 grow">{measure}</DimensionLine>}
    </div>
  );
}
