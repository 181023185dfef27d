import knex, { type Knex } from "knex";
import { knexConfig } from "@/knexfile";
import { config } from "@/lib/runtime/config";
import { processWide } from "@/lib/runtime/processWide";
import { onShutdown } from "@/lib/runtime/shutdown";

/** The process's connection pool to MariaDB. */
export const database = (): Knex =>
  processWide("database", () => {
    const pool = knex(knexConfig(config().DATABASE_URL, config().DATABASE_POOL));
    onShutdown("database", () => pool.destroy());
    return pool;
  });
