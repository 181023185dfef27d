import type { ComponentPropsWithRef } from "react";
import { Field, type FieldFrame } from "./Field";

export interface Choice {
  value: string;
  label: string;
  disabled?: boolean;
}

interface SelectProps extends FieldFrame, Omit<ComponentPropsWithRef<"select">, "children" | "size"> {
  name: string;
  choices: Choice[];
}

/** One of a list, on the browser's own list: it works with every keyboard, screen reader and telephone. */
export function Select({ label, hint, error, unit, choices, id, className = "", ...select }: SelectProps) {
  return (
    <Field id={id ?? select.name} label={label} hint={hint} error={error} unit={unit}>
      {(control) => (
        <select {...select} {...control} className={`blank ${className}`}>
          {choices.map(({ value, label: name, disabled }) => (
            <option key={value} value={value} disabled={disabled}>
              {name}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}
