import type { Knex } from "knex";
import { migrationSource } from "@/db/migrations";

/** How Knex reaches MariaDB, and the migrations it runs. */
export function knexConfig(databaseUrl: string, poolSize = 10): Knex.Config {
  const url = new URL(databaseUrl);
  return {
    client: "mysql2",
    connection: {
      host: url.hostname,
      port: Number(url.port || 3306),
      user: decodeURIComponent(url.username),
      password: decodeURIComponent(url.password),
      database: url.pathname.slice(1),
      charset: "utf8mb4",
      timezone: "Z",
      // Exact decimals arrive as text; counts are small enough to be numbers.
      supportBigNumbers: true,
      connectTimeout: 2000,
    },
    pool: {
      min: 0,
      max: poolSize,
      afterCreate: (connection: { query: (sql: string, done: (error: Error | null) => void) => void }, done: (error: Error | null, connection: unknown) => void) => {
        connection.query("SET SESSION time_zone = '+00:00', SESSION tx_isolation = 'READ-COMMITTED'", (error) => done(error, connection));
      },
    },
    acquireConnectionTimeout: 2500,
    migrations: { migrationSource, tableName: "migrations" },
  };
}

export default knexConfig(process.env.DATABASE_URL ?? "mysql://averduct@127.0.0.1:3306/averduct");
