import { traversesQuery } from "@/api-spec/records/traverses";

/** What the browser of records is asked for by its address; the same as the API's list, days instead of moments. */
export type RecordSearch = Partial<Record<"projectId" | "status" | "system" | "instrumentId" | "from" | "to" | "outsideTolerance" | "sort" | "after" | "view", string>>;

const DAY_MS = 86_400_000;

/** The list's query; what does not fit is left out, as an address is often typed or old. */
export function queryOf({ view: _view, from, to, ...search }: RecordSearch) {
  const asked = { ...search, limit: "30", takenFrom: from && `${from}T00:00:00Z`, takenBefore: to && dayAfter(to) };
  const given = Object.entries(asked).filter(([, value]) => value);
  const whole = traversesQuery.safeParse(Object.fromEntries(given));
  if (whole.success) return whole.data;
  const fitting = given.filter(([name, value]) => traversesQuery.safeParse({ [name]: value }).success);
  return traversesQuery.parse(Object.fromEntries(fitting));
}

function dayAfter(day: string): string | undefined {
  const moment = Date.parse(`${day}T00:00:00Z`);
  return Number.isNaN(moment) ? undefined : new Date(moment + DAY_MS).toISOString();
}

/** The address of the same search with something changed; a change begins at the first page. */
export function addressOf(search: RecordSearch, change: RecordSearch): string {
  const parts = Object.entries({ ...search, after: undefined, ...change }).filter(([, value]) => value);
  return `/records?${new URLSearchParams(parts as [string, string][])}`;
}
