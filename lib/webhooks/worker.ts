import type { Knex } from "knex";
import { database } from "@/db/connection";
import { log } from "@/lib/runtime/log";
import { open } from "@/lib/runtime/secretBox";
import { onShutdown } from "@/lib/runtime/shutdown";
import { tellOwners } from "./disableEndpoint";
import { post, type Message } from "./post";
import { dispatchEvents, dueEndpoints, takeDeliveries, type DueEndpoint, type TakenDelivery } from "./queue";
import { settle } from "./settle";
import { signatureHeaders } from "./signature";
import { targetPolicy, type TargetPolicy } from "./targets";

const IDLE_MS = 500;
const MOST_AT_ONCE = 200;
/** To one endpoint: a slow one does not hold up others, and one that fails is only knocked at. */
const mostAtOnceTo = ({ failing }: DueEndpoint): number => (failing ? 1 : 4);

/** Turns events into deliveries and delivers them, until it is stopped. Any number of workers may share a database. */
export class WebhookWorker {
  readonly #underway = new Map<Promise<void>, DueEndpoint>();
  readonly #running: Promise<void>;
  #stopping = false;
  #wake: () => void = () => {};

  constructor(private readonly db: Knex, private readonly policy: TargetPolicy) {
    this.#running = this.#run();
  }

  /** Takes nothing more, and ends when what is under way has been settled. */
  async stop(): Promise<void> {
    this.#stopping = true;
    this.#wake();
    await this.#running;
    await Promise.all(this.#underway.keys());
  }

  async #run(): Promise<void> {
    while (!this.#stopping) {
      const busy = await this.#round().catch((error: unknown) => {
        log().warn({ err: error }, "events could not be delivered for the moment");
        return false;
      });
      if (!busy) await this.#rest();
    }
  }

  /** Waits until there may be something to do: for a while, or until a delivery under way has made room. */
  #rest(): Promise<void> {
    return new Promise((resolve) => {
      const timer = setTimeout(resolve, IDLE_MS);
      this.#wake = () => {
        clearTimeout(timer);
        resolve();
      };
    });
  }

  async #round(): Promise<boolean> {
    const dispatched = await dispatchEvents(this.db);
    const full = [...this.#underway.values()].filter((endpoint) => this.#roomFor(endpoint) <= 0).map(({ id }) => id);
    const room = MOST_AT_ONCE - this.#underway.size;
    const due = room > 0 ? await dueEndpoints(this.db, full, room) : [];
    let taken = 0;
    for (const endpoint of due) taken += await this.#takeFor(endpoint);
    return dispatched > 0 || taken > 0;
  }

  #roomFor(endpoint: DueEndpoint): number {
    const underway = [...this.#underway.values()].filter(({ id }) => id === endpoint.id).length;
    return Math.min(mostAtOnceTo(endpoint) - underway, MOST_AT_ONCE - this.#underway.size);
  }

  async #takeFor(endpoint: DueEndpoint): Promise<number> {
    const room = this.#roomFor(endpoint);
    const deliveries = room > 0 ? await takeDeliveries(this.db, endpoint.id, room) : [];
    for (const delivery of deliveries) this.#begin(endpoint, delivery);
    return deliveries.length;
  }

  #begin(endpoint: DueEndpoint, delivery: TakenDelivery): void {
    const work = this.#deliver(delivery)
      .catch((error: unknown) => log().warn({ err: error, delivery: delivery.id }, "an attempt could not be settled; it is repeated after its lease"))
      .finally(() => {
        this.#underway.delete(work);
        this.#wake();
      });
    this.#underway.set(work, endpoint);
  }

  async #deliver(delivery: TakenDelivery): Promise<void> {
    const message = signed(delivery);
    const outcome = message === null ? { status: null, error: "The endpoint's secret could not be read.", milliseconds: 0 } : await post(message, this.policy);
    const reason = await this.db.transaction((transaction) => settle(transaction, delivery, outcome), { isolationLevel: "read committed" });
    if (reason !== null) await tellOwners(this.db, delivery.realm, { url: delivery.url, reason }).catch((error: unknown) => log().error({ err: error }, "owners could not be told of a disabled endpoint"));
  }
}

/** A delivery's message, signed for this attempt with the secrets in force; null where those were sealed under another installation's secret. */
function signed({ url, event, secretEncrypted, previousSecretEncrypted, previousSecretUntil }: TakenDelivery): Message | null {
  const now = Date.now();
  const body = JSON.stringify({ type: event.type, timestamp: event.at.toISOString(), data: event.data });
  const previous = previousSecretEncrypted !== null && previousSecretUntil !== null && previousSecretUntil.getTime() > now ? [previousSecretEncrypted] : [];
  try {
    const secrets = [secretEncrypted, ...previous].map(open);
    return { url, body, headers: signatureHeaders(secrets, event.id, Math.floor(now / 1_000), body) };
  } catch (error) {
    log().error({ err: error }, "the secret of a webhook endpoint could not be read");
    return null;
  }
}

/** Starts this process's worker; it stops with the process. */
export function startWebhooks(): void {
  const worker = new WebhookWorker(database(), targetPolicy());
  onShutdown("webhooks", () => worker.stop());
}
