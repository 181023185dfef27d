"use client";

import Link from "next/link";
import { DropdownMenu } from "radix-ui";
import type { ReactNode } from "react";
import { Button } from "./Button";
import type { ButtonSize } from "./buttonStyle";

export type MenuItem =
  | { label: string; href: string; danger?: boolean; disabled?: boolean }
  | { label: string; onSelect: () => void; danger?: boolean; disabled?: boolean };

interface MenuProps {
  /** What the button says. */
  label: ReactNode;
  /** Its name for screen readers, where the label alone does not say it: "Actions for the key Field app". */
  name?: string;
  items: MenuItem[];
  size?: ButtonSize;
}

/** A button that opens a short list of actions or links. The list stays inside its landmark; it is placed past whatever scrolls. */
export function Menu({ label, name, items, size = "small" }: MenuProps) {
  return (
    <DropdownMenu.Root modal={false}>
      <DropdownMenu.Trigger asChild>
        <Button size={size} aria-label={name}>
          {label}
          <svg viewBox="0 0 10 6" width="10" height="6" aria-hidden fill="none" stroke="currentColor" strokeWidth="1.5">
            <path d="M1 1l4 4 4-4" />
          </svg>
        </Button>
      </DropdownMenu.Trigger>
      <DropdownMenu.Content align="end" sideOffset={4} className="z-20 min-w-44 border border-ink rounded-sheet bg-card py-1 text-ink">
        {items.map((item) => {
          const style =
            "block px-3 py-1.5 text-small outline-none data-[highlighted]:bg-inset data-[disabled]:text-muted " +
            (item.danger ? "text-rust" : "");
          return "href" in item ? (
            <DropdownMenu.Item key={item.label} asChild disabled={item.disabled} className={style}>
              <Link href={item.href}>{item.label}</Link>
            </DropdownMenu.Item>
          ) : (
            <DropdownMenu.Item key={item.label} disabled={item.disabled} onSelect={item.onSelect} className={style}>
              {item.label}
            </DropdownMenu.Item>
          );
        })}
      </DropdownMenu.Content>
    </DropdownMenu.Root>
  );
}
