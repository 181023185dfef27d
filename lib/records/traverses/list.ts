import type { Knex } from "knex";
import type { z } from "zod";
import type { traversesQuery } from "@/api-spec/records/traverses";
import type { RecordContext } from "../context";
import { pageOf, type Page } from "../page";
import { summaryOf, type SummaryRow, type TraverseSummary } from "./answer";
import { traverses, type TraverseRow } from "./row";

export type TraverseFilters = Omit<z.output<typeof traversesQuery>, "limit" | "after" | "sort">;
type Reading = Pick<RecordContext, "db" | "realm">;

type Order = "taken" | "created";

/**
 * The index that a list goes by: of the filter that leaves the fewest, in the order asked for. Named, because the database
 * guesses by how full it takes the table to be, and on a full one now and then guesses to sort all of it.
 */
function indexFor({ projectId, system, instrumentId, outsideTolerance, status }: TraverseFilters, order: Order): string {
  const filter = projectId ? "project_id" : system ? "system" : instrumentId ? "instrument_id" : outsideTolerance !== undefined ? "outside_tolerance" : status ? "status" : "all";
  return `traverses_${filter}_${order}`;
}

/** A query of traverses with the filters of a list; each goes by an index. */
export function filteredTraverses(context: Reading, filters: TraverseFilters, order: Order): Knex.QueryBuilder<TraverseRow, TraverseRow[]> {
  const { projectId, status, system, instrumentId, takenFrom, takenBefore, outsideTolerance } = filters;
  const query = traverses(context);
  query.from(context.db.raw("traverses FORCE INDEX (??)", [indexFor(filters, order)]) as unknown as "traverses");
  if (projectId) query.where("project_id", projectId);
  if (status) query.where("traverses.status", status);
  if (system) query.where("system", system);
  if (instrumentId) query.where("instrument_id", instrumentId);
  if (outsideTolerance !== undefined) query.where("outside_tolerance", outsideTolerance ? 1 : 0);
  if (takenFrom) query.where("taken_or_created_at", ">=", new Date(takenFrom)).whereNotNull("taken_at");
  if (takenBefore) query.where("taken_or_created_at", "<", new Date(takenBefore)).whereNotNull("taken_at");
  return query;
}

/** A page of traverses. */
export async function listTraverses(context: Reading, { limit, after, sort, ...filters }: z.output<typeof traversesQuery>): Promise<Page<TraverseSummary>> {
  const by = sort.endsWith("taken") ? "taken" : "created";
  const query = filteredTraverses(context, filters, by).select<SummaryRow[]>(
    "id", "status", "revision", "project_id", "instrument_id", "system", "taken_at", "taken_or_created_at", "percent_of_design", "outside_tolerance", "created_at", "updated_at", "summary",
  ) as unknown as Knex.QueryBuilder<SummaryRow, SummaryRow[]>;
  const direction = sort.startsWith("-") ? "desc" : "asc";
  const order = by === "taken"
    ? { column: "taken_or_created_at", direction, valueOf: ({ taken_or_created_at }: SummaryRow) => taken_or_created_at.toISOString(), parse: (value: string) => new Date(value) } as const
    : // An id begins with the time it was made.
      { column: "traverses.id", direction, valueOf: ({ id }: SummaryRow) => id } as const;
  const { items, next } = await pageOf(query, "traverses", order, { limit, after });
  return { items: items.map(summaryOf), next };
}
