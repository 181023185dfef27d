import { useId, type ComponentPropsWithRef } from "react";
import { FieldError, type FieldFrame } from "./Field";

interface CheckboxProps extends Omit<FieldFrame, "unit">, Omit<ComponentPropsWithRef<"input">, "type" | "size"> {
  name: string;
}

/** One thing that is so or not. */
export function Checkbox({ label, hint, error, id, className = "", ...input }: CheckboxProps) {
  const generated = useId();
  // Several checkboxes may share a name, so the name alone does not identify one.
  const control = id ?? generated;
  const described = [hint && `${control}-hint`, error && `${control}-error`].filter(Boolean).join(" ") || undefined;
  return (
    <div className={className}>
      <div className="flex items-start gap-2.5">
        <input {...input} id={control} type="checkbox" aria-describedby={described} aria-invalid={error ? true : undefined} className="mt-0.75 size-4.5 shrink-0 accent-action" />
        <div className="min-w-0">
          <label htmlFor={control} className="block font-medium">
            {label}
          </label>
          {hint && (
            <p id={`${control}-hint`} className="text-small text-muted">
              {hint}
            </p>
          )}
          {error && <FieldError id={`${control}-error`}>{error}</FieldError>}
        </div>
      </div>
    </div>
  );
}
