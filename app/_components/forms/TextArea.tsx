import type { ComponentPropsWithRef } from "react";
import { Field, type FieldFrame } from "./Field";

interface TextAreaProps extends FieldFrame, ComponentPropsWithRef<"textarea"> {
  name: string;
  mono?: boolean;
}

/** Several lines of text. */
export function TextArea({ label, hint, error, unit, mono = false, id, className = "", ...area }: TextAreaProps) {
  return (
    <Field id={id ?? area.name} label={label} hint={hint} error={error} unit={unit}>
      {(control) => <textarea rows={4} {...area} {...control} className={`blank ${mono ? "font-mono text-small" : ""} ${className}`} />}
    </Field>
  );
}
