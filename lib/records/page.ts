import type { Knex } from "knex";
import { type Problem, refusal } from "@/lib/problems/problem";

/** A page of a list, and where the next one begins. */
export interface Page<Item> {
  items: Item[];
  next: string | null;
}

export interface PageRequest {
  limit: number;
  after?: string | undefined;
}

/** What a list is ordered by: one column, and the id among equals. */
interface Order {
  column: string;
  direction: "asc" | "desc";
  /** The column's value of a row, as the cursor carries it. */
  valueOf: (row: never) => string;
  /** And back, for the query. */
  parse?: (value: string) => unknown;
}

/**
 * One page by keyset: the query goes on behind the last row seen, so that a deep page costs what the first does.
 * @param query What is listed, with its filters.
 * @param table Whose `id` breaks ties.
 */
export async function pageOf<Row extends { id: string }>(query: Knex.QueryBuilder<Row, Row[]>, table: string, { column, direction, valueOf, parse = (value) => value }: Order, { limit, after }: PageRequest): Promise<Page<Row>> {
  const idColumn = `${table}.id`;
  const beyond = direction === "asc" ? ">" : "<";
  if (after !== undefined) {
    const [value, id] = cursorFrom(after);
    const bound = parse(value);
    if (bound instanceof Date && Number.isNaN(bound.getTime())) throw notACursor();
    // Written out, because the database makes no range of an index out of (column, id) < (?, ?).
    if (column === idColumn) query.where(idColumn, beyond, id);
    else query.where((rest) => rest.where(column, beyond, bound as string).orWhere((same) => same.where(column, bound as string).where(idColumn, beyond, id)));
  }
  const order = [...new Set([column, idColumn])].map((name) => ({ column: name, order: direction }));
  const rows = (await query.orderBy(order).limit(limit + 1)) as Row[];
  const items = rows.slice(0, limit);
  const last = items.at(-1);
  return { items, next: rows.length > limit && last ? cursorOf(valueOf(last as never), last.id) : null };
}

const cursorOf = (value: string, id: string): string => Buffer.from(JSON.stringify([value, id])).toString("base64url");

function cursorFrom(text: string): [string, string] {
  try {
    const parsed: unknown = JSON.parse(Buffer.from(text, "base64url").toString("utf8"));
    if (Array.isArray(parsed) && parsed.length === 2 && parsed.every((part) => typeof part === "string")) return parsed as [string, string];
  } catch {
    // Falls through to the refusal: what is no cursor is told so, however it came to be.
  }
  throw notACursor();
}

function notACursor(): Problem {
  return refusal("invalid-request", "This is not the `next` of a page of this list.", { parameter: "after", code: "cursor_not_valid" });
}

/** Text as it may stand in a LIKE pattern. */
export const containing = (text: string): string => `%${text.replace(/[\\%_]/g, "\\$&")}%`;
