import type { ReactNode } from "react";

interface StatProps {
  label: string;
  /** The figure, already written (see format/number). */
  value: string;
  unit?: string;
  /** What it is measured against, or since when. */
  note?: ReactNode;
  /** `large` for the figure a page is about. */
  size?: "normal" | "large";
  /** A share of a limit, 0 to 1 and beyond: drawn as a dimension line below. */
  share?: number;
}

/** One figure with its name and its unit. */
export function Stat({ label, value, unit, note, size = "normal", share }: StatProps) {
  return (
    <div className="min-w-0">
      <p className="text-small text-muted">{label}</p>
      <p className={`font-mono ${size === "large" ? "text-figure" : "text-title"}`}>
        {value}
        {unit && <span className="ml-1.5 text-small text-muted">{unit}</span>}
      </p>
      {share !== undefined && <ShareLine share={share} />}
      {note && <p className="text-small text-muted">{note}</p>}
    </div>
  );
}

/** Ticks at nothing and at the limit; the line between is drawn as far as the share goes. */
function ShareLine({ share }: { share: number }) {
  const percent = Math.min(Math.max(share, 0), 1) * 100;
  return (
    <svg aria-hidden className={`my-1.5 block h-2.5 w-full max-w-56 ${share >= 1 ? "text-rust" : share >= 0.8 ? "text-ochre" : "text-action"}`}>
      <line x1="0" x2="100%" y1="5" y2="5" stroke="var(--edge)" />
      <line x1="0.5" x2="0.5" y1="0" y2="10" stroke="var(--edge)" />
      <line x1="100%" x2="100%" y1="0" y2="10" stroke="var(--edge)" strokeWidth="2" />
      <rect x="0" y="2.5" width={`${percent}%`} height="5" fill="currentColor" />
    </svg>
  );
}
