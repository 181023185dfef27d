import { useId, type ChangeEventHandler, type ReactNode } from "react";
import { FieldError, type FieldFrame } from "./Field";

interface RadioGroupProps extends Omit<FieldFrame, "unit"> {
  name: string;
  choices: { value: string; label: ReactNode; hint?: ReactNode; disabled?: boolean }[];
  defaultValue?: string;
  value?: string;
  onChange?: ChangeEventHandler<HTMLInputElement>;
  /** Side by side rather than one below another. */
  inline?: boolean;
  id?: string;
}

/** One of a few, all of them in sight. */
export function RadioGroup({ name, label, hint, error, choices, defaultValue, value, onChange, inline = false, id }: RadioGroupProps) {
  const generated = useId();
  const group = id ?? generated;
  const described = [hint && `${group}-hint`, error && `${group}-error`].filter(Boolean).join(" ") || undefined;
  return (
    <fieldset id={group} aria-describedby={described} className="min-w-0">
      <legend className="font-medium">{label}</legend>
      {hint && (
        <p id={`${group}-hint`} className="text-small text-muted">
          {hint}
        </p>
      )}
      <div className={inline ? "mt-1 flex flex-wrap gap-x-5 gap-y-1.5" : "mt-1.5 grid gap-1.5"}>
        {choices.map((choice) => (
          <label key={choice.value} className="flex items-start gap-2.5">
            <input
              type="radio"
              name={name}
              value={choice.value}
              disabled={choice.disabled}
              defaultChecked={value === undefined ? choice.value === defaultValue : undefined}
              checked={value === undefined ? undefined : choice.value === value}
              onChange={onChange}
              readOnly={value !== undefined && onChange === undefined}
              className="mt-0.75 size-4.5 shrink-0 accent-action"
            />
            <span className="min-w-0">
              {choice.label}
              {choice.hint && <span className="block text-small text-muted">{choice.hint}</span>}
            </span>
          </label>
        ))}
      </div>
      {error && <FieldError id={`${group}-error`}>{error}</FieldError>}
    </fieldset>
  );
}
