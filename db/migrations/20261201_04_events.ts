import type { Knex } from "knex";
import { identifier, moment, textColumn } from "../columns";

/** What happened to records, and its delivery to whoever asked to be told. */
export async function up(knex: Knex): Promise<void> {
  const realm = (table: Knex.CreateTableBuilder): void => {
    identifier(table, "organisation_id").notNullable().references("organisations.id").onDelete("CASCADE");
    table.enum("environment", ["sandbox", "production"]).notNullable();
  };

  await knex.schema.createTable("events", (table) => {
    identifier(table, "id").primary();
    realm(table);
    textColumn(table, "type", 60).notNullable();
    table.json("data").notNullable();
    moment(table, "at").notNullable().defaultTo(knex.fn.now(3));
    // Written with the change; a worker makes a delivery for each endpoint and then marks it.
    moment(table, "dispatched_at").nullable();
    table.index(["organisation_id", "environment", "id"]);
    table.index(["organisation_id", "environment", "type", "id"]);
    table.index(["dispatched_at", "id"]);
    table.index(["at"]);
  });

  await knex.schema.createTable("webhook_endpoints", (table) => {
    identifier(table, "id").primary();
    realm(table);
    table.integer("version").unsigned().notNullable().defaultTo(1);
    table.string("url", 500).notNullable();
    table.string("description", 200).nullable();
    table.json("event_types").notNullable();
    table.text("secret_encrypted").notNullable();
    // After a rotation the secret before it signs as well, for a while.
    table.text("previous_secret_encrypted").nullable();
    moment(table, "previous_secret_until").nullable();
    moment(table, "failing_since").nullable();
    moment(table, "disabled_at").nullable();
    table.string("disabled_reason", 300).nullable();
    moment(table, "created_at").notNullable().defaultTo(knex.fn.now(3));
    moment(table, "updated_at").notNullable().defaultTo(knex.fn.now(3));
    table.index(["organisation_id", "environment", "id"]);
  });

  await knex.schema.createTable("deliveries", (table) => {
    identifier(table, "id").primary();
    realm(table);
    identifier(table, "event_id").notNullable().references("events.id").onDelete("CASCADE");
    identifier(table, "webhook_endpoint_id").notNullable().references("webhook_endpoints.id").onDelete("CASCADE");
    table.enum("status", ["pending", "delivered", "failed"]).notNullable().defaultTo("pending");
    table.integer("attempts").unsigned().notNullable().defaultTo(0);
    // While pending: when to try, or until when a worker that has taken it may be at it.
    moment(table, "next_attempt_at").nullable();
    moment(table, "created_at").notNullable().defaultTo(knex.fn.now(3));
    moment(table, "delivered_at").nullable();
    // Which endpoints have something due, and what, without looking at what else waits for a slow one.
    table.index(["status", "webhook_endpoint_id", "next_attempt_at"], "deliveries_due");
    table.index(["webhook_endpoint_id", "id"]);
    table.index(["event_id"]);
  });

  await knex.schema.createTable("delivery_attempts", (table) => {
    identifier(table, "delivery_id").notNullable().references("deliveries.id").onDelete("CASCADE");
    table.specificType("number", "SMALLINT UNSIGNED").notNullable();
    table.primary(["delivery_id", "number"]);
    moment(table, "at").notNullable().defaultTo(knex.fn.now(3));
    table.specificType("status", "SMALLINT UNSIGNED").nullable();
    table.string("error", 300).nullable();
    table.integer("milliseconds").unsigned().notNullable();
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const table of ["delivery_attempts", "deliveries", "webhook_endpoints", "events"]) await knex.schema.dropTable(table);
}
