import { useId, type ReactNode } from "react";

/** What every field takes. */
export interface FieldFrame {
  /** Always shown. */
  label: ReactNode;
  /** What to write and in what form, below the label. */
  hint?: ReactNode;
  /** What is wrong, in words; beside the field, and tied to it for screen readers. */
  error?: string;
  /** The unit of what is written, at the right of the blank. */
  unit?: string;
}

/** What a control inside a field must carry. */
export interface ControlAttributes {
  id: string;
  "aria-describedby": string | undefined;
  "aria-invalid": true | undefined;
}

interface FieldProps extends FieldFrame {
  /** The control's id; an error summary links to it. TextInput and the others use `id ?? name`. */
  id?: string;
  /** Shown after the label where most fields are needed and this one is not. */
  optional?: boolean;
  children: (control: ControlAttributes) => ReactNode;
}

/** The frame of one control: label, hint, the control, its unit and its error. */
export function Field({ id, label, hint, error, unit, optional = false, children }: FieldProps) {
  const generated = useId();
  const control = id ?? generated;
  const hintId = hint ? `${control}-hint` : null;
  const errorId = error ? `${control}-error` : null;

  return (
    <div className="min-w-0">
      <label htmlFor={control} className="block font-medium">
        {label}
        {optional && <span className="font-normal text-muted"> (optional)</span>}
      </label>
      {hint && (
        <p id={`${control}-hint`} className="text-small text-muted">
          {hint}
        </p>
      )}
      <div className="mt-1 flex items-center gap-2">
        {children({
          id: control,
          "aria-describedby": [hintId, errorId].filter(Boolean).join(" ") || undefined,
          "aria-invalid": error ? true : undefined,
        })}
        {unit && <span className="shrink-0 font-mono text-small text-muted">{unit}</span>}
      </div>
      {error && <FieldError id={`${control}-error`}>{error}</FieldError>}
    </div>
  );
}

/** The words of an error, with its shape. */
export function FieldError({ id, children }: { id: string; children: string }) {
  return (
    <p id={id} className="mt-1 flex gap-1.5 text-small text-rust">
      <svg viewBox="0 0 12 12" width="12" height="12" aria-hidden className="mt-0.75 shrink-0" fill="none" stroke="currentColor" strokeWidth="1.5">
        <path d="M2 2l8 8M10 2l-8 8" />
      </svg>
      <span>{children}</span>
    </p>
  );
}
