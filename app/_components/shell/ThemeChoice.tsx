"use client";

import { useId, useSyncExternalStore } from "react";
import { THEME_COOKIE, themeFrom, type Theme } from "./themes";

const CHOICES = [
  { value: "system", label: "System" },
  { value: "light", label: "Light" },
  { value: "dark", label: "Dark" },
] as const;
type Choice = (typeof CHOICES)[number]["value"];

const ONE_YEAR_S = 31_536_000;

/** The document element holds the choice; every control on the page reads it there. */
const current = (): Choice => themeFrom(document.documentElement.dataset.theme) ?? "system";

function onChange(listener: () => void): () => void {
  const observer = new MutationObserver(listener);
  observer.observe(document.documentElement, { attributes: true, attributeFilter: ["data-theme"] });
  return () => observer.disconnect();
}

function choose(choice: Choice): void {
  const theme: Theme | undefined = choice === "system" ? undefined : choice;
  if (theme) document.documentElement.dataset.theme = theme;
  else delete document.documentElement.dataset.theme;
  document.cookie = `${THEME_COOKIE}=${theme ?? ""}; path=/; max-age=${theme ? ONE_YEAR_S : 0}; samesite=lax`;
}

/** Light, dark, or as the reader's system has it. */
export function ThemeChoice() {
  const choice = useSyncExternalStore(onChange, current, (): Choice => "system");
  const id = useId();
  return (
    <div className="flex items-center gap-2 text-small">
      <label htmlFor={id} className="text-muted">
        Appearance
      </label>
      <select
        id={id}
        value={choice}
        onChange={(event) => choose(event.target.value as Choice)}
        className="min-h-7 border border-edge rounded-control bg-card px-1.5 text-ink"
      >
        {CHOICES.map(({ value, label }) => (
          <option key={value} value={value}>
            {label}
          </option>
        ))}
      </select>
    </div>
  );
}
