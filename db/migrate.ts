import knex from "knex";
import { knexConfig } from "@/knexfile";
import { withDatabase } from "@/lib/launch/withDatabase";

/** `npm run migrate` brings the database up to date; `npm run migrate -- down` takes the latest migration back. */
export async function main([direction = "up"]: string[]): Promise<void> {
  await withDatabase(async (databaseUrl) => {
    const db = knex(knexConfig(databaseUrl));
    try {
      const [, done] = (direction === "down" ? await db.migrate.down() : await db.migrate.latest()) as [number, string[]];
      console.log(done.length > 0 ? done.join("\n") : "Nothing to do.");
    } finally {
      await db.destroy();
    }
  });
}
