import type { ReactNode } from "react";

interface DefinitionListProps {
  items: { term: ReactNode; value: ReactNode }[];
  /** Values are figures, keys or codes. */
  mono?: boolean;
}

/** Facts in ruled rows: the name at the left, the value at the right; one above the other where it is narrow. */
export function DefinitionList({ items, mono = false }: DefinitionListProps) {
  return (
    <dl className="border-t">
      {items.map(({ term, value }, index) => (
        <div key={index} className="grid gap-x-6 border-b py-1.5 sm:grid-cols-[minmax(9rem,14rem)_1fr]">
          <dt className="text-muted">{term}</dt>
          <dd className={`min-w-0 ${mono ? "font-mono text-small" : ""}`}>{value}</dd>
        </div>
      ))}
    </dl>
  );
}
