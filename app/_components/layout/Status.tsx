import type { ReactNode } from "react";
import { Sign, type Standing } from "./signs";

interface StatusProps {
  standing: Standing;
  /** The word: "Active", "Suspended", "Undecided". */
  children: ReactNode;
}

/** How a thing stands: a shape and a word. */
export function Status({ standing, children }: StatusProps) {
  return (
    <span className="inline-flex items-center gap-1.5 whitespace-nowrap">
      <Sign standing={standing} size={13} />
      {children}
    </span>
  );
}
