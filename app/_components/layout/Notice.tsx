import type { ReactNode } from "react";
import { Sign } from "./signs";

export type NoticeKind = "good" | "information" | "caution" | "failure";

interface NoticeProps {
  kind?: NoticeKind;
  /** The word at its head; by default "Done", "Note", "Caution" or "Failed". */
  title?: string;
  children: ReactNode;
  /** Read out when it appears: for what comes up after an action. */
  live?: boolean;
}

const WORDS: Record<NoticeKind, string> = { good: "Done", information: "Note", caution: "Caution", failure: "Failed" };
const SIDE: Record<NoticeKind, string> = {
  good: "border-l-action bg-action-wash",
  information: "border-l-edge bg-inset",
  caution: "border-l-ochre bg-ochre-wash",
  failure: "border-l-rust bg-rust-wash",
};

/** A message in the page: what happened, what it means, what to do. */
export function Notice({ kind = "information", title = WORDS[kind], children, live = false }: NoticeProps) {
  return (
    <div role={live ? (kind === "failure" ? "alert" : "status") : undefined} className={`flex gap-3 border-l-4 px-3.5 py-2.5 ${SIDE[kind]}`}>
      <span className="mt-0.75">
        <Sign standing={kind} size={18} />
      </span>
      <div className="min-w-0">
        <p className="font-semibold">{title}</p>
        <div className="max-w-2xl [&_a]:underline">{children}</div>
      </div>
    </div>
  );
}
