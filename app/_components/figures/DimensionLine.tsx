import type { ReactNode } from "react";

/** A line with ticks at both ends that carries a measure, as on a drawing: how wide a figure is, how many rows a list has. */
export function DimensionLine({ children, className = "" }: { children: ReactNode; className?: string }) {
  return (
    <div className={`flex items-center gap-2 text-muted ${className}`}>
      <Arm side="left" />
      <span className="shrink-0 font-mono text-fine">{children}</span>
      <Arm side="right" />
    </div>
  );
}

function Arm({ side }: { side: "left" | "right" }) {
  return (
    <span aria-hidden className={`relative h-3 grow border-edge ${side === "left" ? "border-l" : "border-r"}`}>
      <span className="absolute inset-x-0 top-1/2 h-px bg-edge" />
      <span className={`absolute top-1/2 h-px w-2.5 bg-edge ${side === "left" ? "-left-[5px]" : "-right-[5px]"} -rotate-45`} />
    </span>
  );
}
