import { beforeAll, describe, expect, it } from "vitest";
import { filteredTraverses, type TraverseFilters } from "@/lib/records/traverses/list";
import { testDatabase } from "../support/accounts";
import { arrange, partner, SUPPLY_MAIN } from "../support/records";

describe("every list of traverses goes by an index in the order asked for", () => {
  let realm: { organisationId: string; environment: "sandbox" };
  let filters: Record<string, TraverseFilters>;
  beforeAll(async () => {
    const app = await partner();
    const references = await arrange(app);
    for (let number = 0; number < 3; number += 1) await app.send("post", "/traverses", { ...SUPPLY_MAIN, ...references }).expect(201);
    realm = { organisationId: app.organisationId, environment: "sandbox" };
    filters = {
      all: {}, project_id: { projectId: references.projectId }, status: { status: "draft" }, system: { system: "AHU-1" },
      instrument_id: { instrumentId: references.instrumentId }, outside_tolerance: { outsideTolerance: false },
    };
  });

  const cases = ["all", "project_id", "status", "system", "instrument_id", "outside_tolerance"].flatMap((filter) => (["taken", "created"] as const).map((order) => [filter, order] as const));
  it.each(cases)("%s, by %s", async (filter, order) => {
    const column = order === "taken" ? "taken_or_created_at" : "traverses.id";
    const query = filteredTraverses({ db: testDatabase(), realm }, filters[filter]!, order).select("traverses.id").orderBy([{ column, order: "desc" }, { column: "traverses.id", order: "desc" }]).limit(51);
    const [[plan]] = (await testDatabase().raw(`EXPLAIN ${query.toQuery()}`)) as [[{ key: string; Extra: string; type: string }]];
    expect(plan).toMatchObject({ key: `traverses_${filter}_${order}` });
    expect(["ref", "range"]).toContain(plan.type);
    expect(plan.Extra).not.toMatch(/filesort|temporary/);
  });
});
