/** Centres of the nine points, in the order a duct is read: hole by hole, from the near wall to the far one. */
const POINTS = [6, 12, 18].flatMap((x) => [7, 12, 17].map((y) => ({ x, y })));
const MIDDLE = 4;

interface MarkProps {
  /** Height and width in pixels. */
  size?: number;
  /**
   * `mark`: the middle point open. `empty`: every point open, nothing read yet. `reading`: points fill one after another.
   */
  state?: "mark" | "empty" | "reading";
  /** Say it to screen readers; left out where text beside it already does. */
  title?: string;
  className?: string;
}

/** A duct's cross-section with its grid of points: the product's mark, and the picture of empty and of busy. */
export function Mark({ size = 24, state = "mark", title, className }: MarkProps) {
  return (
    <svg
      viewBox="0 0 24 24"
      width={size}
      height={size}
      className={className}
      fill="none"
      stroke="currentColor"
      role={title ? "img" : undefined}
      aria-label={title}
      aria-hidden={title ? undefined : true}
    >
      <rect x="1.25" y="2.25" width="21.5" height="19.5" rx="3.25" strokeWidth="1.5" />
      {POINTS.map(({ x, y }, index) => {
        const open = state === "empty" || (state === "mark" && index === MIDDLE);
        return (
          <circle
            key={index}
            cx={x}
            cy={y}
            r={open ? 1.5 : 1.35}
            strokeWidth={open || state === "reading" ? 0.9 : 0}
            fill={open ? "none" : "currentColor"}
            style={state === "reading" ? { animation: `reading 1.8s ${index * 0.12}s infinite both` } : undefined}
          />
        );
      })}
    </svg>
  );
}
