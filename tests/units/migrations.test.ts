import { mkdtempSync, rmSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import knex, { type Knex } from "knex";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { startPrivateServer, type PrivateServer } from "@/db/privateServer";
import { knexConfig } from "@/knexfile";

describe("migrations", () => {
  let folder: string;
  let server: PrivateServer;
  let db: Knex;
  beforeAll(async () => {
    folder = mkdtempSync(path.join(os.tmpdir(), "averduct-migrations-"));
    server = await startPrivateServer(folder);
    db = knex(knexConfig(server.url));
  }, 60_000);
  afterAll(async () => {
    await db.destroy();
    await server.stop();
    rmSync(folder, { recursive: true, force: true });
  });

  const tables = async (): Promise<string[]> => (await db("information_schema.tables").where({ table_schema: "averduct" }).pluck("table_name")).filter((name: string) => !name.startsWith("migrations")).sort();
  const shape = async (): Promise<unknown> => db("information_schema.columns").where({ table_schema: "averduct" }).orderBy(["table_name", "ordinal_position"]).select("table_name", "column_name", "column_type", "is_nullable");

  it("run up, all the way down, and up to the same tables again", async () => {
    await db.migrate.latest();
    const [names, columns] = [await tables(), await shape()];
    expect(names).toContain("api_keys");
    await db.migrate.rollback(undefined, true);
    expect(await tables()).toEqual([]);
    await db.migrate.latest();
    expect([await tables(), await shape()]).toEqual([names, columns]);
  }, 60_000);
});
