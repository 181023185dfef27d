import type request from "supertest";
import type { EventType } from "@/api-spec/records/events";
import type { Environment } from "@/lib/keys/keyText";
import type { Realm } from "@/lib/records/realm";
import { recordEvent } from "@/lib/webhooks/recordEvent";
import { makeKey, testDatabase } from "./accounts";
import { api } from "./api";
import { until } from "./receiver";

export interface Partner {
  realm: Realm;
  call(method: "get" | "post" | "patch" | "delete", path: string, body?: object): request.Test;
}

/** A key for webhooks, and its realm. */
export async function partner(organisationId?: string, environment: Environment = "sandbox"): Promise<Partner> {
  const key = await makeKey({ scopes: ["webhooks", "calculations"], environment, ...(organisationId !== undefined && { organisationId }) });
  return {
    realm: { organisationId: key.organisationId, environment },
    call: (method, path, body) => api()[method](`/api/v1${path}`).set("Authorization", `Bearer ${key.text}`).send(body),
  };
}

export async function makeEndpoint({ call }: Partner, url: string, eventTypes: EventType[] = ["traverse.issued"]): Promise<{ id: string; secret: string }> {
  return (await call("post", "/webhook-endpoints", { url, eventTypes }).expect(201)).body;
}

/** What changing a record does: an event in a transaction. Gives the event's id. */
export async function happen({ realm }: Partner, type: EventType = "traverse.issued", data: object = { id: "trv_1" }): Promise<string> {
  await testDatabase().transaction((db) => recordEvent(db, realm, type, data));
  const { id } = await testDatabase()("events").where({ organisation_id: realm.organisationId, environment: realm.environment }).orderBy("id", "desc").first();
  return id;
}

/** The deliveries of an endpoint, as the API tells of them, once they are as wanted. */
export const deliveriesWhen = ({ call }: Partner, endpoint: string, wanted: (items: Delivery[]) => boolean, patienceMs?: number): Promise<Delivery[]> =>
  until("the deliveries to be as wanted", async () => {
    const { body } = await call("get", `/webhook-endpoints/${endpoint}/deliveries`).expect(200);
    return wanted(body.items) && body.items;
  }, patienceMs);

export interface Delivery {
  id: string;
  eventId: string;
  status: "pending" | "delivered" | "failed";
  attempts: { at: string; status: number | null; error: string | null; milliseconds: number }[];
  nextAttemptAt: string | null;
  deliveredAt: string | null;
}

/** Lets the pause before a delivery's next attempt pass. */
export const skipPause = (delivery: string): Promise<number> => testDatabase()("deliveries").where({ id: delivery, status: "pending" }).update({ next_attempt_at: new Date(Date.now() - 1_000) });
