"use client";

import { useEffect, useState } from "react";
import { Button } from "./Button";
import type { ButtonSize } from "./buttonStyle";

interface CopyButtonProps {
  /** The text that is copied. */
  text: string;
  /** What is copied, for the button's name: "key", "request". */
  what?: string;
  size?: ButtonSize;
}

const SHOWN_FOR_MS = 2_000;

/** Copies a text and says whether it worked. */
export function CopyButton({ text, what = "", size = "small" }: CopyButtonProps) {
  const [outcome, setOutcome] = useState<"copied" | "refused" | null>(null);

  useEffect(() => {
    if (outcome === null) return;
    const timer = setTimeout(() => setOutcome(null), SHOWN_FOR_MS);
    return () => clearTimeout(timer);
  }, [outcome]);

  const copy = async () => {
    try {
      await navigator.clipboard.writeText(text);
      setOutcome("copied");
    } catch {
      // Browsers refuse outside a secure context or without permission; the text stays selectable.
      setOutcome("refused");
    }
  };

  return (
    <>
      <Button size={size} onClick={copy}>
        {outcome === "copied" ? "Copied" : outcome === "refused" ? "Select and copy" : "Copy"}
        {what && <span className="sr-only">{what}</span>}
      </Button>
      <span role="status" className="sr-only">
        {outcome === "copied" && `Copied ${what}`}
        {outcome === "refused" && "The browser did not allow copying. Select the text and copy it."}
      </span>
    </>
  );
}
