import type { FormError } from "./FormErrors";

/** A problem as the portal's routes answer it. */
interface ProblemDocument {
  title?: string;
  detail?: string;
  errors?: { pointer: string; detail: string }[];
}

/** Thrown when a route did not do what was asked; its message is fit to be read. */
export class Refused extends Error {
  constructor(
    message: string,
    readonly status: number,
    /** By the field's name, the first part of the problem's pointer. */
    readonly errors: FormError[],
  ) {
    super(message);
  }
}

/** Posts JSON to one of the portal's own routes and returns the answer. Throws `Refused` with the fields at fault. */
export async function postToPortal<Answer = Record<string, never>>(path: string, body: unknown = {}): Promise<Answer> {
  let response: Response;
  try {
    response = await fetch(`/api/portal/${path}`, { method: "POST", headers: { "Content-Type": "application/json" }, body: JSON.stringify(body) });
  } catch {
    throw new Refused("The server could not be reached. Check the connection and try again; nothing was changed.", 0, []);
  }
  const content: unknown = response.status === 204 ? {} : await response.json().catch(() => ({}));
  if (response.ok) return content as Answer;
  const problem = content as ProblemDocument;
  const errors = (problem.errors ?? []).map(({ pointer, detail }) => ({ field: pointer.split("/")[1] || undefined, message: detail }));
  throw new Refused(problem.detail ?? problem.title ?? "It could not be done. Try again.", response.status, errors);
}
