import { RateLimiterMySQL } from "rate-limiter-flexible";
import { database } from "@/db/connection";

/** A limiter whose counts all instances share through the database. */
export const storedLimiter = (points: number, duration: number, keyPrefix = "limit"): RateLimiterMySQL =>
  new RateLimiterMySQL({
    storeClient: database(),
    storeType: "knex",
    dbName: String(database().client.config.connection.database),
    tableName: "rate_limits",
    tableCreated: true,
    keyPrefix,
    points,
    duration,
  });
