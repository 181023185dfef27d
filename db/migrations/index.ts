import type { Knex } from "knex";
import * as accounts from "./20261201_01_accounts";
import * as keysAndUsage from "./20261201_02_keys_and_usage";
import * as records from "./20261201_03_records";
import * as events from "./20261201_04_events";

/** Every migration, in the order they run. Named here so that they load the same way everywhere. */
const MIGRATIONS: Record<string, Knex.Migration> = {
  "20261201_01_accounts": accounts,
  "20261201_02_keys_and_usage": keysAndUsage,
  "20261201_03_records": records,
  "20261201_04_events": events,
};

export const migrationSource: Knex.MigrationSource<string> = {
  getMigrations: async () => Object.keys(MIGRATIONS),
  getMigrationName: (name) => name,
  getMigration: async (name) => MIGRATIONS[name]!,
};
