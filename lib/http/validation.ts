import type { z } from "zod";
import type { AirflowInputError } from "@/lib/airflow/errors";
import { pointerTo, Problem, type ProblemFault } from "@/lib/problems/problem";

/** Never answers with more than this many faults: a wrong list of a thousand readings is understood from the first few. */
const MOST_FAULTS = 50;

type Issue = z.core.$ZodIssue;

/** Validates what a caller sent. Throws one problem that lists every field at fault. */
export function validate<Schema extends z.ZodType>(schema: Schema, value: unknown, where: "body" | "query" | "path" = "body"): z.output<Schema> {
  const result = schema.safeParse(value);
  if (result.success) return result.data;
  const faults = result.error.issues.flatMap((issue) => faultsOf(issue, value)).slice(0, MOST_FAULTS);
  const errors = where === "body" ? faults : faults.map(toParameterFault);
  throw new Problem("invalid-request", { detail: summary(errors), errors });
}

function toParameterFault({ pointer, ...fault }: ProblemFault): ProblemFault {
  return { pointer: "", parameter: pointer.slice(1), ...fault };
}

function summary(errors: ProblemFault[]): string {
  const [first] = errors;
  if (!first) return "The request does not fit the operation.";
  const place = first.parameter ?? (first.pointer || "the body");
  const more = errors.length > 1 ? ` There ${errors.length === 2 ? "is one more fault" : `are ${errors.length - 1} more faults`}.` : "";
  return `At ${place}: ${first.detail}${more}`;
}

function faultsOf(issue: Issue, root: unknown, prefix: PropertyKey[] = []): ProblemFault[] {
  const path = [...prefix, ...issue.path];
  switch (issue.code) {
    case "unrecognized_keys":
      return issue.keys.map((key) => ({
        pointer: pointerTo([...path, key]),
        code: "unrecognized_field",
        detail: `The field "${key}" is not defined here. Check its spelling or leave it out.`,
      }));
    case "invalid_union":
      return unionFaults(issue, root, path);
    case "invalid_type":
      return [valueAt(root, path) === undefined ? missing(path, issue.expected) : fault(path, "invalid_type", `Expected ${article(issue.expected)}, got ${kindOf(valueAt(root, path))}.`)];
    case "invalid_value":
      return [valueAt(root, path) === undefined ? missing(path, `one of ${issue.values.map(String).join(", ")}`) : fault(path, "invalid_value", `Expected ${issue.values.length === 1 ? "" : "one of "}${issue.values.map((one) => JSON.stringify(one)).join(", ")}, got ${shown(valueAt(root, path))}.`)];
    case "too_small":
      return [fault(path, "too_small", isCount(issue.origin) ? `Needs at least ${counted(issue.minimum, issue.origin)}.` : `Must be ${issue.inclusive === false ? "greater than" : "at least"} ${issue.minimum}.`)];
    case "too_big":
      return [fault(path, "too_large", isCount(issue.origin) ? `Takes at most ${counted(issue.maximum, issue.origin)}.` : `Must be ${issue.inclusive === false ? "less than" : "at most"} ${issue.maximum}.`)];
    case "custom":
      return [fault(path, typeof issue.params?.code === "string" ? issue.params.code : "invalid_value", issue.message)];
    default:
      return [fault(path, issue.code, issue.message)];
  }
}

/** The faults of the alternative that came nearest; where none came near, what the alternatives are told apart by. */
function unionFaults(issue: Extract<Issue, { code: "invalid_union" }>, root: unknown, path: PropertyKey[]): ProblemFault[] {
  if (issue.discriminator !== undefined) {
    const at = path.at(-1) === issue.discriminator ? path : [...path, issue.discriminator];
    const value = valueAt(root, at);
    const options = "options" in issue && Array.isArray(issue.options) ? `: one of ${issue.options.map((option) => JSON.stringify(option)).join(", ")}` : "";
    return [value === undefined ? missing(at, `the field that says which kind it is${options}`) : fault(at, "invalid_value", `${shown(value)} is not a kind known here${options}.`)];
  }
  const alternatives = issue.errors.map((issues) => issues.flatMap((one) => faultsOf(one, root, path)));
  // What is of another type altogether, such as null, was not meant; of the others, the one with the fewest faults was.
  const isOtherType = (faults: ProblemFault[]): number => Number(faults.some(({ pointer, code }) => code === "invalid_type" && pointer === pointerTo(path)));
  const nearest = alternatives.filter((faults) => faults.length > 0).sort((one, other) => isOtherType(one) - isOtherType(other) || one.length - other.length)[0];
  return nearest ?? [fault(path, "invalid_value", issue.message)];
}

const fault = (path: PropertyKey[], code: string, detail: string): ProblemFault => ({ pointer: pointerTo(path), code, detail });

/** A missing field is pointed at through the object that lacks it, which exists in what was sent. */
function missing(path: PropertyKey[], expected: string): ProblemFault {
  const name = String(path.at(-1) ?? "");
  return fault(path.slice(0, -1), "missing_field", name ? `The field "${name}" is missing; expected ${article(expected)}.` : `The body is missing; expected ${article(expected)}.`);
}

const article = (expected: string): string => (/^(one|the|an?) /.test(expected) ? expected : `${/^[aeiou]/.test(expected) ? "an" : "a"} ${expected === "record" ? "object" : expected}`);

const isCount = (origin: string): boolean => ["array", "string", "set", "map"].includes(origin);
function counted(count: number | bigint, origin: string): string {
  const [one, many] = origin === "string" ? ["character", "characters"] : ["entry", "entries"];
  return `${count} ${Number(count) === 1 ? one : many}`;
}

function kindOf(value: unknown): string {
  if (value === null) return "null";
  if (Array.isArray(value)) return "an array";
  if (typeof value === "number" && !Number.isFinite(value)) return "a number too large to represent";
  return `${typeof value === "object" ? "an" : "a"} ${typeof value}`;
}

function shown(value: unknown): string {
  const text = JSON.stringify(value) ?? String(value);
  return text.length > 60 ? `${text.slice(0, 57)}…` : text;
}

function existingPart(root: unknown, path: readonly PropertyKey[]): readonly PropertyKey[] {
  return path.length === 0 || valueAt(root, path) !== undefined ? path : existingPart(root, path.slice(0, -1));
}

function valueAt(root: unknown, path: readonly PropertyKey[]): unknown {
  let value = root;
  for (const part of path) {
    if (typeof value !== "object" || value === null || !Object.hasOwn(value, part)) return undefined;
    value = (value as Record<PropertyKey, unknown>)[part];
  }
  return value;
}

/**
 * The engine's own refusal of an input, as a problem.
 * @param sent What the caller sent, where that is at hand: what is missing in it is pointed at through what lacks it.
 */
export function impossibleInput(error: AirflowInputError, sent?: unknown): Problem {
  const errors = error.faults.map(({ path, code, detail }) => ({ pointer: pointerTo(sent === undefined ? path : existingPart(sent, path)), code, detail }));
  return new Problem("impossible-input", { detail: summary(errors), errors });
}
