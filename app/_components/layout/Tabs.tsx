"use client";

import { Tabs as Parts } from "radix-ui";
import type { ReactNode } from "react";

export interface Tab {
  id: string;
  label: ReactNode;
  content: ReactNode;
}

interface TabsProps {
  /** What the tabs choose between, for screen readers. */
  label: string;
  tabs: Tab[];
  /** The tab open at first; the first one when left out. */
  initial?: string;
  /** With `onChange`, whoever uses it keeps the choice. */
  value?: string;
  onChange?: (id: string) => void;
  /** At the right end of the row of tabs. */
  aside?: ReactNode;
}

/** Several views of the same place, on a line of points: the open one is the open point. */
export function Tabs({ label, tabs, initial = tabs[0]?.id, value, onChange, aside }: TabsProps) {
  return (
    <Parts.Root defaultValue={value === undefined ? initial : undefined} value={value} onValueChange={onChange}>
      <div className="flex flex-wrap items-end justify-between gap-x-4 border-b border-edge">
        <Parts.List aria-label={label} className="flex flex-wrap">
          {tabs.map(({ id, label: name }) => (
            <Parts.Trigger
              key={id}
              value={id}
              className="group relative px-3.5 pt-1.5 pb-2.5 text-small text-muted hover:text-ink data-[state=active]:font-semibold data-[state=active]:text-ink"
            >
              {name}
              <span
                aria-hidden
                className="absolute -bottom-[4.5px] left-1/2 size-2 -translate-x-1/2 rounded-full bg-edge group-data-[state=active]:size-2.5 group-data-[state=active]:border-2 group-data-[state=active]:border-action group-data-[state=active]:bg-card"
              />
            </Parts.Trigger>
          ))}
        </Parts.List>
        {aside && <div className="pb-1.5">{aside}</div>}
      </div>
      {tabs.map(({ id, content }) => (
        <Parts.Content key={id} value={id} className="pt-3">
          {content}
        </Parts.Content>
      ))}
    </Parts.Root>
  );
}
