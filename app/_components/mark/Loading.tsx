import { Mark } from "./Mark";

interface LoadingProps {
  /** What is awaited: "Reading the usage". */
  label: string;
  /** Pixels of the mark. */
  size?: number;
}

/** Says that something is under way; the points of the mark fill in reading order. */
export function Loading({ label, size = 28 }: LoadingProps) {
  return (
    <p role="status" className="flex items-center gap-3 py-3 text-muted">
      <Mark state="reading" size={size} className="shrink-0" />
      <span>{label}</span>
    </p>
  );
}
