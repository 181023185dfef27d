"use client";

import { useEffect, useRef } from "react";
import { Sign } from "../layout/signs";

export interface FormError {
  /** The id of the field it is about: the field's `name`, unless it was given an id. Left out for the form as a whole. */
  field?: string;
  message: string;
}

interface FormErrorsProps {
  errors: FormError[];
  title?: string;
}

/** What is wrong with a form, in one place at its head, each line a link to its field. It takes the focus when it appears. */
export function FormErrors({ errors, title = "The form was not accepted" }: FormErrorsProps) {
  const element = useRef<HTMLDivElement>(null);

  useEffect(() => {
    if (errors.length > 0) element.current?.focus();
  }, [errors]);

  if (errors.length === 0) return null;
  return (
    <div ref={element} role="alert" tabIndex={-1} className="flex gap-3 border-2 border-rust rounded-sheet bg-rust-wash px-3.5 py-2.5">
      <span className="mt-0.75">
        <Sign standing="failure" size={18} />
      </span>
      <div className="min-w-0">
        <p className="font-semibold">{title}</p>
        <ul>
          {errors.map(({ field, message }) => (
            <li key={`${field ?? ""} ${message}`}>
              {field ? (
                <a href={`#${field}`} className="underline">
                  {message}
                </a>
              ) : (
                message
              )}
            </li>
          ))}
        </ul>
      </div>
    </div>
  );
}
