"use client";

import { useState, type FormEvent } from "react";
import type { FormError } from "./FormErrors";
import { postToPortal, Refused } from "./postToPortal";

/**
 * A form that posts to one of the portal's routes: its errors by field, and whether it is under way.
 *
 * @param path Route below /api/portal.
 * @param bodyOf The request from the form's fields.
 * @param onDone What happens with the answer.
 */
export function usePortalForm<Answer>(path: string, bodyOf: (fields: FormData) => unknown, onDone: (answer: Answer) => void) {
  const [errors, setErrors] = useState<FormError[]>([]);
  const [pending, setPending] = useState(false);

  const submit = async (event: FormEvent<HTMLFormElement>): Promise<void> => {
    event.preventDefault();
    setPending(true);
    try {
      const answer = await postToPortal<Answer>(path, bodyOf(new FormData(event.currentTarget)));
      setErrors([]);
      onDone(answer);
    } catch (error) {
      const refused = error instanceof Refused ? error : new Refused("Something went wrong in this page. Reload it and try again.", 0, []);
      setErrors(refused.errors.length > 0 ? refused.errors : [{ message: refused.message }]);
    } finally {
      setPending(false);
    }
  };

  const errorOf = (field: string): string | undefined => errors.find((error) => error.field === field)?.message;
  return { submit, errors, errorOf, pending };
}
