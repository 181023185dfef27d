import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";

const ROOT = path.join(import.meta.dirname, "../..");
const TABLES = ["projects", "instruments", "calibrations", "traverses", "traverse_history", "attachments", "events", "webhook_endpoints", "deliveries", "idempotency_keys", "imports"];
/** A query that begins at one of the tables, whoever's rows they are. */
const QUERY = new RegExp(`\\b(?:db|database\\(\\)|transaction|trx|context\\.db)(?:<[^>()]*>)?\\(\\s*["'\`](?:${TABLES.join("|")})(?: as \\w+)?["'\`]`);

/** Where queries may go across realms, and why. */
const ACROSS: Record<string, string> = {
  "lib/records/realm.ts": "the one place that puts a realm to a query",
  "lib/records/verifyRecord.ts": "an issued record is public by its id",
  "lib/records/attachments/content.ts": "a link that ends is all that its holder needs",
  "lib/records/attachments/objects.ts": "files without a row are swept up, whoever's they were",
  "lib/webhooks/queue.ts": "a worker delivers for everybody",
  "lib/webhooks/settle.ts": "the worker's outcome of what it took",
  "lib/webhooks/calibrationDue.ts": "housekeeping for everybody",
  "lib/launch/housekeeping.ts": "housekeeping for everybody",
};

const files = ["lib", "app"].flatMap((folder) =>
  readdirSync(path.join(ROOT, folder), { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && /\.tsx?$/.test(entry.name))
    .map((entry) => path.relative(ROOT, path.join(entry.parentPath, entry.name))),
);

describe("queries of records", () => {
  it("begin at a realm, everywhere but where the reason is written down", () => {
    const across = files.filter((file) => QUERY.test(readFileSync(path.join(ROOT, file), "utf8")));
    expect(across.filter((file) => !(file in ACROSS))).toEqual([]);
  });

  it("are found by this test where they go across", () => {
    expect(QUERY.test('db("traverses").where({ id })')).toBe(true);
    expect(QUERY.test("database()<Row>('projects')")).toBe(true);
    expect(QUERY.test('recordsOf(db, "traverses", realm)')).toBe(false);
  });
});
