import type { Knex } from "knex";
import { identifier, moment, textColumn } from "../columns";

/** What a row of a record belongs to: an organisation, and one of its environments. */
function realm(table: Knex.CreateTableBuilder): void {
  identifier(table, "organisation_id").notNullable().references("organisations.id").onDelete("CASCADE");
  table.enum("environment", ["sandbox", "production"]).notNullable();
}

function times(table: Knex.CreateTableBuilder, knex: Knex): void {
  moment(table, "created_at").notNullable().defaultTo(knex.fn.now(3));
  moment(table, "updated_at").notNullable().defaultTo(knex.fn.now(3));
}

/** Projects, instruments with their calibrations, traverses with history, attachments and signatures. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable("projects", (table) => {
    identifier(table, "id").primary();
    realm(table);
    table.integer("version").unsigned().notNullable().defaultTo(1);
    table.string("name", 160).notNullable();
    table.string("number", 60).nullable();
    table.string("location", 300).nullable();
    table.string("notes", 4000).nullable();
    times(table, knex);
    table.index(["organisation_id", "environment", "id"]);
    table.index(["organisation_id", "environment", "name", "id"]);
  });

  await knex.schema.createTable("instruments", (table) => {
    identifier(table, "id").primary();
    realm(table);
    table.integer("version").unsigned().notNullable().defaultTo(1);
    table.string("name", 160).notNullable();
    table.string("manufacturer", 120).nullable();
    table.string("model", 120).nullable();
    table.string("serial_number", 120).nullable();
    // Principle, assumed density, accuracy, and the probe: as the calculations take them.
    table.json("properties").notNullable();
    // Of the latest calibration, so that a list of what is due needs one table.
    table.date("calibration_due").nullable();
    moment(table, "calibration_due_told_at").nullable();
    table.string("notes", 4000).nullable();
    times(table, knex);
    table.index(["organisation_id", "environment", "id"]);
    table.index(["organisation_id", "environment", "name", "id"]);
    table.index(["organisation_id", "environment", "calibration_due", "id"], "instruments_due");
    // What is due and has not been told: what has been told is not looked through again.
    table.index(["calibration_due_told_at", "calibration_due"], "instruments_to_tell");
  });

  await knex.schema.createTable("calibrations", (table) => {
    identifier(table, "id").primary();
    realm(table);
    identifier(table, "instrument_id").notNullable().references("instruments.id").onDelete("CASCADE");
    table.date("calibrated_on").notNullable();
    table.date("due_on").notNullable();
    table.string("laboratory", 160).nullable();
    table.string("certificate_number", 120).nullable();
    table.double("gain").notNullable().defaultTo(1);
    table.json("offset").nullable();
    moment(table, "created_at").notNullable().defaultTo(knex.fn.now(3));
    table.index(["instrument_id", "calibrated_on", "id"]);
  });

  await knex.schema.createTable("traverses", (table) => {
    identifier(table, "id").primary();
    realm(table);
    table.integer("version").unsigned().notNullable().defaultTo(1);
    table.enum("status", ["draft", "issued", "superseded", "void"]).notNullable().defaultTo("draft");
    table.integer("revision").unsigned().notNullable().defaultTo(1);
    identifier(table, "project_id").notNullable().references("projects.id");
    identifier(table, "instrument_id").nullable().references("instruments.id");
    identifier(table, "supersedes_id").nullable().references("traverses.id");
    identifier(table, "superseded_by_id").nullable().references("traverses.id");
    table.string("system", 120).nullable();
    moment(table, "taken_at").nullable();
    // When it was taken, or else made: what lists are ordered by has to be there always.
    moment(table, "taken_or_created_at").notNullable();
    // What was measured and what is known of it, as it was sent; what the engine made of it, working included.
    table.json("input").notNullable();
    table.json("result").nullable();
    // What lists show of both, so that they need not read the whole.
    table.json("summary").notNullable();
    // The instrument and its calibration as they were on the day, with what the calculation takes of them.
    table.json("instrument_snapshot").nullable();
    textColumn(table, "engine_version", 20).nullable();
    table.double("percent_of_design").nullable();
    table.boolean("outside_tolerance").nullable();
    moment(table, "issued_at").nullable();
    moment(table, "voided_at").nullable();
    table.string("void_reason", 1000).nullable();
    times(table, knex);
    const listed = ["organisation_id", "environment"];
    for (const filter of [[], ["project_id"], ["status"], ["system"], ["instrument_id"], ["outside_tolerance"]]) {
      table.index([...listed, ...filter, "taken_or_created_at", "id"], `traverses_${filter[0] ?? "all"}_taken`);
      table.index([...listed, ...filter, "id"], `traverses_${filter[0] ?? "all"}_created`);
    }
    table.index(["supersedes_id"]);
  });

  await knex.schema.createTable("traverse_history", (table) => {
    identifier(table, "id").primary();
    realm(table);
    identifier(table, "traverse_id").notNullable().references("traverses.id").onDelete("CASCADE");
    textColumn(table, "action", 40).notNullable();
    // Who: the key, or the person in the portal.
    identifier(table, "api_key_id").nullable();
    identifier(table, "user_id").nullable();
    table.json("details").nullable();
    moment(table, "at").notNullable().defaultTo(knex.fn.now(3));
    table.index(["traverse_id", "id"]);
  });

  await knex.schema.createTable("signing_keys", (table) => {
    // The key id in the JWS header: the thumbprint of the public key (RFC 7638).
    textColumn(table, "id", 64).primary();
    textColumn(table, "algorithm", 20).notNullable();
    table.json("public_jwk").notNullable();
    table.text("private_encrypted").notNullable();
    moment(table, "created_at").notNullable().defaultTo(knex.fn.now(3));
    moment(table, "retired_at").nullable();
  });

  await knex.schema.createTable("issued_documents", (table) => {
    identifier(table, "traverse_id").primary().references("traverses.id");
    // Canonical JSON (RFC 8785), exactly as signed.
    table.specificType("document", "MEDIUMTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin").notNullable();
    textColumn(table, "signature", 500).notNullable();
    textColumn(table, "signing_key_id", 64).notNullable().references("signing_keys.id");
    moment(table, "issued_at").notNullable();
  });

  await knex.schema.createTable("attachments", (table) => {
    identifier(table, "id").primary();
    realm(table);
    identifier(table, "traverse_id").notNullable().references("traverses.id");
    table.string("file_name", 200).notNullable();
    table.string("caption", 500).nullable();
    textColumn(table, "media_type", 40).notNullable();
    table.integer("bytes").unsigned().notNullable();
    table.specificType("sha256", "BINARY(32)").notNullable();
    textColumn(table, "storage_key", 200).notNullable();
    moment(table, "created_at").notNullable().defaultTo(knex.fn.now(3));
    table.index(["traverse_id", "id"]);
  });

  await knex.schema.createTable("idempotency_keys", (table) => {
    realm(table);
    table.specificType("idempotency_key", "VARCHAR(200) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin").notNullable();
    table.primary(["organisation_id", "environment", "idempotency_key"]);
    // Of operation, path and body: the same key for something else is refused.
    table.specificType("fingerprint", "BINARY(32)").notNullable();
    table.specificType("status", "SMALLINT UNSIGNED").nullable();
    table.json("headers").nullable();
    table.specificType("answer", "MEDIUMTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin").nullable();
    moment(table, "created_at").notNullable().defaultTo(knex.fn.now(3));
    table.index(["created_at"]);
  });

  await knex.schema.createTable("imports", (table) => {
    identifier(table, "id").primary();
    realm(table);
    table.string("name", 200).nullable();
    // Of the file and its options. Null once a file was imported again after all its drafts had been deleted.
    table.specificType("sha256", "BINARY(32)").nullable();
    table.integer("row_count").unsigned().notNullable();
    table.integer("traverse_count").unsigned().notNullable();
    // As it was answered.
    table.json("report").notNullable();
    moment(table, "created_at").notNullable();
    table.unique(["organisation_id", "environment", "sha256"]);
    table.index(["organisation_id", "environment", "id"]);
  });

  for (const trigger of IMMUTABLE) await knex.raw(trigger);
}

/**
 * What was issued stays as it was issued, whoever holds a connection: of an issued traverse nothing changes but that it
 * is superseded or void, and it is never deleted; what was signed never changes at all.
 */
const IMMUTABLE = [
  `CREATE TRIGGER traverses_issued_stay BEFORE UPDATE ON traverses FOR EACH ROW
   IF OLD.status <> 'draft' AND NOT (
     NEW.id = OLD.id AND NEW.organisation_id = OLD.organisation_id AND NEW.environment = OLD.environment
     AND NEW.revision = OLD.revision AND NEW.project_id = OLD.project_id AND NEW.instrument_id <=> OLD.instrument_id
     AND NEW.supersedes_id <=> OLD.supersedes_id AND NEW.system <=> OLD.system AND NEW.taken_at <=> OLD.taken_at
     AND NEW.taken_or_created_at = OLD.taken_or_created_at AND NEW.input = OLD.input AND NEW.result <=> OLD.result AND NEW.summary = OLD.summary AND NEW.instrument_snapshot <=> OLD.instrument_snapshot
     AND NEW.engine_version <=> OLD.engine_version AND NEW.percent_of_design <=> OLD.percent_of_design
     AND NEW.outside_tolerance <=> OLD.outside_tolerance AND NEW.issued_at <=> OLD.issued_at AND NEW.created_at = OLD.created_at
     AND (NEW.status = OLD.status OR (OLD.status = 'issued' AND NEW.status IN ('superseded', 'void')) OR (OLD.status = 'superseded' AND NEW.status = 'void'))
   ) THEN SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'an issued traverse cannot be changed'; END IF`,
  `CREATE TRIGGER traverses_issued_remain BEFORE DELETE ON traverses FOR EACH ROW
   IF OLD.status <> 'draft' THEN SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'an issued traverse cannot be deleted'; END IF`,
  `CREATE TRIGGER issued_documents_stay BEFORE UPDATE ON issued_documents FOR EACH ROW
   SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'what was signed cannot be changed'`,
  `CREATE TRIGGER issued_documents_remain BEFORE DELETE ON issued_documents FOR EACH ROW
   SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'what was signed cannot be deleted'`,
];

export async function down(knex: Knex): Promise<void> {
  for (const table of ["imports", "idempotency_keys", "attachments", "issued_documents", "signing_keys", "traverse_history", "traverses", "calibrations", "instruments", "projects"]) {
    await knex.schema.dropTable(table);
  }
}
