import knex from "knex";
import { knexConfig } from "@/knexfile";

/** Brings a database's tables up to date. */
export async function prepareDatabase(databaseUrl: string): Promise<void> {
  const db = knex(knexConfig(databaseUrl));
  try {
    await db.migrate.latest();
  } finally {
    await db.destroy();
  }
}
