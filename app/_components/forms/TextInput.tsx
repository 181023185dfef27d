import type { ComponentPropsWithRef } from "react";
import { Field, type FieldFrame } from "./Field";

interface TextInputProps extends FieldFrame, Omit<ComponentPropsWithRef<"input">, "size"> {
  name: string;
  /** Keys, codes and figures are set in the monospaced face. */
  mono?: boolean;
}

/** One line of text, or a number, a date, a password: `type` and every other attribute of `input` pass through. */
export function TextInput({ label, hint, error, unit, mono = false, id, className = "", ...input }: TextInputProps) {
  return (
    <Field id={id ?? input.name} label={label} hint={hint} error={error} unit={unit}>
      {(control) => <input type="text" {...input} {...control} className={`blank ${mono ? "font-mono text-small" : ""} ${className}`} />}
    </Field>
  );
}
