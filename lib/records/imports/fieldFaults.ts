import type { z } from "zod";
import type { InputFault, Path } from "@/lib/airflow/errors";

type Issue = z.core.$ZodIssue;

/** What a traverse's schema finds wrong with it, in words that fit a cell. */
export const fieldFaults = (issue: Issue, root: unknown, prefix: Path = []): InputFault[] => {
  const path = [...prefix, ...(issue.path as Path)];
  const fault = (code: string, detail: string, at: Path = path): InputFault[] => [{ path: at, code, detail }];
  switch (issue.code) {
    case "invalid_union":
      return issue.discriminator === undefined ? nearestAlternative(issue, root, path) : fault("missing_cell", "This is needed to tell what the other cells mean.", path.at(-1) === issue.discriminator ? path : [...path, issue.discriminator]);
    case "unrecognized_keys":
      return issue.keys.flatMap((key) => fault("does_not_belong", "This does not go with the other cells of the row. Leave it empty, or check those.", [...path, key]));
    case "invalid_type":
    case "invalid_value":
      return valueAt(root, path) === undefined ? fault("missing_cell", "The cell is empty, and the others of its kind need it.") : fault(issue.code, issue.message);
    case "too_small":
      return fault("too_small", issue.origin === "string" ? "The cell is too short." : `Must be ${issue.inclusive === false ? "greater than" : "at least"} ${issue.minimum}.`);
    case "too_big":
      return fault("too_large", issue.origin === "string" ? `Takes at most ${issue.maximum} characters.` : `Must be ${issue.inclusive === false ? "less than" : "at most"} ${issue.maximum}.`);
    case "invalid_format":
      return fault("invalid_format", issue.format === "datetime" ? "Write date and time in ISO 8601 with the offset from UTC, e.g. 2026-11-20T14:05:00Z." : issue.message);
    case "custom":
      return fault(typeof issue.params?.["code"] === "string" ? issue.params["code"] : "invalid_value", issue.message);
    default:
      return fault(issue.code, issue.message);
  }
};

/** The faults of the alternative with the fewest; one of another type altogether, such as null, was not meant. */
function nearestAlternative({ errors, message }: Extract<Issue, { code: "invalid_union" }>, root: unknown, path: Path): InputFault[] {
  const meant = errors.filter((issues) => !issues.some((issue) => issue.code === "invalid_type" && issue.path.length === 0));
  const alternatives = meant.map((issues) => issues.flatMap((issue) => fieldFaults(issue, root, path)));
  return alternatives.sort((one, other) => one.length - other.length)[0] ?? [{ path, code: "invalid_value", detail: message }];
}

function valueAt(root: unknown, path: Path): unknown {
  let value = root;
  for (const part of path) {
    if (typeof value !== "object" || value === null || !Object.hasOwn(value, part)) return undefined;
    value = (value as Record<string | number, unknown>)[part];
  }
  return value;
}
