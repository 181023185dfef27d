import type { Knex } from "knex";
import { identifier, moment, textColumn } from "../columns";

/** Who may sign in, for which organisation, and what an organisation's plan allows. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable("plans", (table) => {
    textColumn(table, "id", 32).primary();
    table.string("name", 80).notNullable();
    table.integer("monthly_requests").unsigned().notNullable();
    table.integer("requests_per_second").unsigned().notNullable();
  });

  await knex("plans").insert([
    { id: "trial", name: "Trial", monthly_requests: 10_000, requests_per_second: 10 },
    { id: "practice", name: "Practice", monthly_requests: 250_000, requests_per_second: 50 },
    { id: "platform", name: "Platform", monthly_requests: 5_000_000, requests_per_second: 500 },
  ]);

  await knex.schema.createTable("organisations", (table) => {
    identifier(table, "id").primary();
    table.string("name", 120).notNullable();
    textColumn(table, "plan_id", 32).notNullable().references("plans.id");
    moment(table, "suspended_at").nullable();
    table.string("suspended_reason", 500).nullable();
    moment(table, "created_at").notNullable().defaultTo(knex.fn.now(3));
  });

  await knex.schema.createTable("users", (table) => {
    identifier(table, "id").primary();
    table.string("email", 254).notNullable().unique();
    table.string("name", 120).notNullable();
    table.string("password_hash", 200).notNullable();
    moment(table, "email_verified_at").nullable();
    table.boolean("is_administrator").notNullable().defaultTo(false);
    moment(table, "created_at").notNullable().defaultTo(knex.fn.now(3));
  });

  await knex.schema.createTable("memberships", (table) => {
    identifier(table, "organisation_id").notNullable().references("organisations.id").onDelete("CASCADE");
    identifier(table, "user_id").notNullable().references("users.id").onDelete("CASCADE");
    table.enum("role", ["owner", "developer", "viewer"]).notNullable();
    moment(table, "created_at").notNullable().defaultTo(knex.fn.now(3));
    table.primary(["organisation_id", "user_id"]);
    table.index(["user_id"]);
  });

  await knex.schema.createTable("sessions", (table) => {
    identifier(table, "id").primary();
    table.specificType("token_hash", "BINARY(32)").notNullable().unique();
    identifier(table, "user_id").notNullable().references("users.id").onDelete("CASCADE");
    table.string("address", 45).notNullable();
    table.string("user_agent", 300).notNullable();
    moment(table, "created_at").notNullable().defaultTo(knex.fn.now(3));
    moment(table, "last_seen_at").notNullable().defaultTo(knex.fn.now(3));
    moment(table, "expires_at").notNullable();
    table.index(["user_id", "created_at"]);
    table.index(["expires_at"]);
  });

  await knex.schema.createTable("email_tokens", (table) => {
    identifier(table, "id").primary();
    identifier(table, "user_id").notNullable().references("users.id").onDelete("CASCADE");
    table.enum("purpose", ["verify_email", "reset_password"]).notNullable();
    table.specificType("token_hash", "BINARY(32)").notNullable().unique();
    moment(table, "created_at").notNullable().defaultTo(knex.fn.now(3));
    moment(table, "expires_at").notNullable();
    moment(table, "used_at").nullable();
    table.index(["user_id", "purpose"]);
  });

  await knex.schema.createTable("local_mailbox", (table) => {
    identifier(table, "id").primary();
    table.string("recipient", 254).notNullable();
    table.string("subject", 300).notNullable();
    table.text("body").notNullable();
    moment(table, "sent_at").notNullable().defaultTo(knex.fn.now(3));
    table.index(["recipient", "id"]);
  });

  await knex.schema.createTable("audit_log", (table) => {
    identifier(table, "id").primary();
    identifier(table, "organisation_id").nullable();
    identifier(table, "actor_user_id").nullable();
    textColumn(table, "action", 60).notNullable();
    table.string("subject", 120).notNullable();
    table.json("details").nullable();
    table.string("address", 45).nullable();
    moment(table, "at").notNullable().defaultTo(knex.fn.now(3));
    table.index(["organisation_id", "id"]);
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const table of ["audit_log", "local_mailbox", "email_tokens", "sessions", "memberships", "users", "organisations", "plans"]) {
    await knex.schema.dropTable(table);
  }
}
