import type { ReactNode } from "react";
import { CopyButton } from "../actions/CopyButton";
import { Notice } from "../layout/Notice";

interface SecretProps {
  /** What it is: "Key", "Signing secret", "Recovery codes". */
  label: string;
  value: string;
  /** Where to keep it; stands after the sentence that it is shown once. */
  children?: ReactNode;
}

/** A secret at the one moment it can be read. */
export function Secret({ label, value, children }: SecretProps) {
  return (
    <Notice kind="caution" title={`${label}: shown once`}>
      <p>Copy it now. It is not stored and cannot be shown again. {children}</p>
      <div className="mt-2 flex flex-wrap items-start gap-2">
        <code className="min-w-0 flex-1 basis-64 select-all whitespace-pre-wrap break-all border border-edge rounded-control bg-card px-2.5 py-1 text-ink">
          {value}
        </code>
        <CopyButton text={value} what={label.toLowerCase()} />
      </div>
    </Notice>
  );
}
