import { readFileSync } from "node:fs";
import path from "node:path";

/** Requests made from the contract: JSON that fits a schema, and the same with one thing wrong. */

export interface Schema {
  $ref?: string;
  type?: string | string[];
  enum?: unknown[];
  const?: unknown;
  anyOf?: Schema[];
  oneOf?: Schema[];
  allOf?: Schema[];
  properties?: Record<string, Schema>;
  required?: string[];
  additionalProperties?: boolean | Schema;
  items?: Schema;
  minItems?: number;
  maxItems?: number;
  minimum?: number;
  maximum?: number;
  exclusiveMinimum?: number;
  exclusiveMaximum?: number;
  minLength?: number;
  maxLength?: number;
  pattern?: string;
  format?: string;
}

export interface Operation {
  operationId: string;
  parameters?: { name: string; in: "path" | "query" | "header"; required?: boolean; schema: Schema }[];
  requestBody?: { content: Record<string, { schema: Schema }> };
  responses: Record<string, unknown>;
}

const document = JSON.parse(readFileSync(path.join(import.meta.dirname, "../../api-spec/openapi.json"), "utf8")) as {
  paths: Record<string, Record<string, Operation>>;
  components: { schemas: Record<string, Schema> };
};

/** Every operation of the document, with its method and path. */
export const documentedOperations = (): { method: string; path: string; operation: Operation }[] =>
  Object.entries(document.paths).flatMap(([at, methods]) => Object.entries(methods).map(([method, operation]) => ({ method, path: at, operation })));

/** A generator of the same draws for the same seed. */
export function draws(seed: number) {
  let state = seed >>> 0;
  const next = (): number => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
  const upTo = (most: number): number => Math.floor(next() * (most + 1));
  return { next, upTo, chance: (share: number): boolean => next() < share, pick: <Item>(items: readonly Item[]): Item => items[Math.floor(next() * items.length)]! };
}
export type Draws = ReturnType<typeof draws>;

const ID_LETTERS = "0123456789abcdefghjkmnpqrstvwxyz";

/** A value that fits a schema, as far as a schema can say. `known` has ids that exist, by their prefix. */
export function fitting(schema: Schema, by: Draws, known: Record<string, string[]> = {}, depth = 0): unknown {
  const inner = (one: Schema): unknown => fitting(one, by, known, depth + 1);
  if (schema.$ref) return inner(document.components.schemas[schema.$ref.split("/").at(-1)!]!);
  if (schema.const !== undefined) return schema.const;
  if (schema.enum) return by.pick(schema.enum);
  const choices = schema.anyOf ?? schema.oneOf;
  if (choices) return inner(by.pick(choices));
  if (schema.allOf) return Object.assign({}, ...schema.allOf.map((one) => inner(one) as object));
  const type = Array.isArray(schema.type) ? by.pick(schema.type) : schema.type;
  switch (type) {
    case "object":
      return Object.fromEntries(
        Object.entries(schema.properties ?? {}).filter(([name]) => schema.required?.includes(name) || by.chance(depth > 3 ? 0.2 : 0.5)).map(([name, one]) => [name, inner(one)]),
      );
    case "array":
      return Array.from({ length: Math.min(schema.maxItems ?? 4, (schema.minItems ?? 0) + by.upTo(3)) }, () => inner(schema.items ?? {}));
    case "string":
      return text(schema, by, known);
    case "number":
    case "integer":
      return number(schema, by, type === "integer");
    case "boolean":
      return by.chance(0.5);
    default:
      return null;
  }
}

function text({ pattern, format, minLength = 0, maxLength = 40 }: Schema, by: Draws, known: Record<string, string[]>): string {
  const prefix = /^\^([a-z]+)_/.exec(pattern ?? "")?.[1];
  if (prefix) {
    const ids = known[prefix] ?? [];
    return ids.length > 0 && by.chance(0.8) ? by.pick(ids) : `${prefix}_0${Array.from({ length: 25 }, () => by.pick([...ID_LETTERS])).join("")}`;
  }
  if (format === "date-time") return new Date(Date.UTC(2026, by.upTo(10), 1 + by.upTo(27), by.upTo(23))).toISOString();
  if (format === "date") return `2026-0${1 + by.upTo(8)}-1${by.upTo(9)}`;
  if (format === "uri") return "https://partner.example/told";
  const letters = by.pick(["abc ", "ä€𝔘 ", "=+-@", "<&\"'>", "'; --"]);
  return Array.from({ length: Math.max(minLength, Math.min(maxLength, 1 + by.upTo(12))) }, () => by.pick([...letters])).join("").slice(0, maxLength).trim() || "x";
}

function number({ minimum, maximum, exclusiveMinimum, exclusiveMaximum }: Schema, by: Draws, whole: boolean): number {
  const low = Math.max(minimum ?? -20, exclusiveMinimum ?? -20, -1e9);
  const high = Math.min(maximum ?? 200, exclusiveMaximum ?? 200);
  const value = low + by.next() * Math.max(0, high - low);
  return whole ? Math.max(Math.ceil(low), Math.round(value)) : by.chance(0.3) ? Math.ceil(value) : value;
}

const WRONG = [null, true, -1, 0, 1e308, -1e308, 1.5, "", "x".repeat(300), "\u0000", [], {}, [[]], { value: "1" }, "__proto__", Number.MAX_SAFE_INTEGER + 2];

/** The same JSON with one thing changed somewhere: left out, of another kind, beyond all bounds, or one field too many. */
export function spoiled(value: unknown, by: Draws): unknown {
  const copy: unknown = structuredClone(value);
  const places: { holder: Record<string, unknown>; name: string }[] = [];
  const walk = (node: unknown): void => {
    if (typeof node !== "object" || node === null) return;
    for (const name of Object.keys(node)) {
      places.push({ holder: node as Record<string, unknown>, name });
      walk((node as Record<string, unknown>)[name]);
    }
  };
  walk(copy);
  if (places.length === 0) return by.pick(WRONG);
  const { holder, name } = by.pick(places);
  const way = by.upTo(3);
  if (way === 0 && !Array.isArray(holder)) delete holder[name];
  else if (way === 1 && !Array.isArray(holder)) holder[by.pick(["colour", "constructor", "toString", "units "])] = by.pick(WRONG);
  else holder[name] = by.pick(WRONG);
  return copy;
}
