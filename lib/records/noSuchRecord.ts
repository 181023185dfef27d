import { Problem, refusal } from "@/lib/problems/problem";

/** The answer where there is no such record, or where it is another's: which of the two is not told. */
export function noSuchRecord(what: string): Problem {
  return refusal("not-found", `There is no such ${what} in this organisation and environment.`);
}

/** The same for a record that a body refers to. */
export function noSuchReference(pointer: string, what: string): Problem {
  const detail = `There is no such ${what} in this organisation and environment.`;
  return new Problem("invalid-request", { detail: `At ${pointer}: ${detail}`, errors: [{ pointer, code: "not_found", detail }] });
}
