/** How something stands. Each kind has its own shape and its own word, so that colour never speaks alone. */
export type Standing = "good" | "information" | "caution" | "failure" | "neutral";

export const STANDING_COLOUR: Record<Standing, string> = {
  good: "text-action",
  information: "text-muted",
  caution: "text-ochre",
  failure: "text-rust",
  neutral: "text-edge",
};

/** Disc: good. Square with a stroke: to know. Triangle: caution. Octagon with a cross: failure. Ring: neither. */
export function Sign({ standing, size = 16 }: { standing: Standing; size?: number }) {
  return (
    <svg viewBox="0 0 16 16" width={size} height={size} aria-hidden fill="none" stroke="currentColor" strokeWidth="1.5" className={`shrink-0 ${STANDING_COLOUR[standing]}`}>
      {standing === "good" && <circle cx="8" cy="8" r="5.25" fill="currentColor" />}
      {standing === "neutral" && <circle cx="8" cy="8" r="5.25" />}
      {standing === "information" && <path d="M2.75 2.75h10.5v10.5H2.75z M8 7v3.75 M8 4.75v.75" />}
      {standing === "caution" && <path d="M8 2L14.5 13.5h-13z M8 6.5v3 M8 11v.75" strokeLinejoin="round" />}
      {standing === "failure" && <path d="M5.25 1.75h5.5l3.5 3.5v5.5l-3.5 3.5h-5.5l-3.5-3.5v-5.5z M5.75 5.75l4.5 4.5 M10.25 5.75l-4.5 4.5" />}
    </svg>
  );
}
