import type { z } from "zod";
import type { eventAnswer, eventsQuery } from "@/api-spec/records/events";
import type { RecordContext } from "@/lib/records/context";
import { noSuchRecord } from "@/lib/records/noSuchRecord";
import { pageOf, type Page } from "@/lib/records/page";
import { recordsOf } from "@/lib/records/realm";

type Event = z.output<typeof eventAnswer>;
type Reading = Pick<RecordContext, "db" | "realm">;

interface EventRow {
  id: string;
  type: Event["type"];
  data: Event["data"];
  at: Date;
}

const eventOf = ({ id, type, data, at }: EventRow): Event => ({ id, type, timestamp: at.toISOString(), data });

/** What happened, the latest first. */
export async function listEvents({ db, realm }: Reading, { type, ...page }: z.output<typeof eventsQuery>): Promise<Page<Event>> {
  const query = recordsOf<EventRow>(db, "events", realm);
  if (type) query.where("events.type", type);
  const { items, next } = await pageOf(query, "events", { column: "events.id", direction: "desc", valueOf: ({ id }: EventRow) => id }, page);
  return { items: items.map(eventOf), next };
}

export async function readEvent({ db, realm }: Reading, id: string): Promise<Event> {
  const row = await recordsOf<EventRow>(db, "events", realm).where("events.id", id).first();
  if (!row) throw noSuchRecord("event");
  return eventOf(row);
}
