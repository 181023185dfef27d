import type { Knex } from "knex";
import { identifier, moment, textColumn } from "../columns";

/** API keys, what they were used for, and the shared limiter's counters. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable("api_keys", (table) => {
    identifier(table, "id").primary();
    identifier(table, "organisation_id").notNullable().references("organisations.id").onDelete("CASCADE");
    table.enum("environment", ["sandbox", "production"]).notNullable();
    table.string("name", 80).notNullable();
    table.specificType("secret_hash", "BINARY(32)").notNullable();
    // The last characters of the key text, so that a person can tell keys apart.
    textColumn(table, "ending", 4).notNullable();
    table.json("scopes").notNullable();
    table.json("allowed_networks").nullable();
    moment(table, "expires_at").nullable();
    moment(table, "revoked_at").nullable();
    identifier(table, "replaced_by").nullable();
    identifier(table, "created_by").nullable().references("users.id").onDelete("SET NULL");
    moment(table, "created_at").notNullable().defaultTo(knex.fn.now(3));
    moment(table, "last_used_at").nullable();
    table.string("last_used_from", 45).nullable();
    table.index(["organisation_id", "id"]);
  });

  // No foreign keys: refused requests of nobody are counted too (organisation and key are then empty),
  // and what was used stays on the account's record after a key is gone.
  await knex.schema.createTable("usage_minutes", (table) => {
    identifier(table, "organisation_id").notNullable();
    moment(table, "minute").notNullable();
    identifier(table, "api_key_id").notNullable();
    table.enum("environment", ["none", "sandbox", "production"]).notNullable();
    textColumn(table, "operation", 60).notNullable();
    table.specificType("status", "SMALLINT UNSIGNED").notNullable();
    table.integer("requests").unsigned().notNullable();
    table.integer("items").unsigned().notNullable();
    table.bigInteger("microseconds").unsigned().notNullable();
    table.integer("slowest_microseconds").unsigned().notNullable();
    table.primary(["organisation_id", "minute", "api_key_id", "operation", "status"]);
    table.index(["minute"]);
  });

  await knex.schema.createTable("requests", (table) => {
    identifier(table, "id").primary();
    identifier(table, "organisation_id").notNullable();
    identifier(table, "api_key_id").notNullable();
    table.enum("environment", ["none", "sandbox", "production"]).notNullable();
    textColumn(table, "operation", 60).notNullable();
    table.specificType("status", "SMALLINT UNSIGNED").notNullable();
    textColumn(table, "problem", 60).nullable();
    table.string("address", 45).notNullable();
    table.integer("microseconds").unsigned().notNullable();
    moment(table, "at").notNullable();
    table.index(["organisation_id", "id"]);
    table.index(["at"]);
  });

  // The shape rate-limiter-flexible's MySQL store expects.
  await knex.schema.createTable("rate_limits", (table) => {
    textColumn(table, "key", 255).primary();
    table.bigInteger("points").notNullable().defaultTo(0);
    table.bigInteger("expire").unsigned().nullable();
    table.index(["expire"]);
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const table of ["rate_limits", "requests", "usage_minutes", "api_keys"]) await knex.schema.dropTable(table);
}
