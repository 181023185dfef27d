import type { Knex } from "knex";
import { sendMail } from "@/lib/mail/sendMail";
import { recordsOf, type Realm } from "@/lib/records/realm";
import { config } from "@/lib/runtime/config";

/** Stops deliveries to an endpoint, and gives up those that wait. In the caller's transaction. */
export async function disableEndpoint(db: Knex, realm: Realm, id: string, reason: string): Promise<void> {
  const now = new Date();
  await recordsOf(db, "webhook_endpoints", realm).where("webhook_endpoints.id", id).update({ disabled_at: now, disabled_reason: reason, version: db.raw("version + 1"), updated_at: now } as never);
  await recordsOf(db, "deliveries", realm).where({ webhook_endpoint_id: id, status: "pending" }).update({ status: "failed", next_attempt_at: null } as never);
}

/** Writes to the organisation's owners that an endpoint was disabled, and why. */
export async function tellOwners(db: Knex, { organisationId, environment }: Realm, { url, reason }: { url: string; reason: string }): Promise<void> {
  const owners: string[] = await db("memberships as m").join("users as u", "u.id", "m.user_id").where({ "m.organisation_id": organisationId, "m.role": "owner" }).pluck("u.email");
  const text = `Averduct no longer sends events to this webhook endpoint of your ${environment} environment:\n\n${url}\n\n${reason}\n\nWhat was not delivered is kept for 90 days. Once the endpoint answers again, enable it, and have the failed deliveries sent again from its log: ${new URL("/webhooks", config().AVERDUCT_URL).href}`;
  for (const to of owners) await sendMail({ to, subject: "A webhook endpoint was disabled", text });
}
