import { readFileSync } from "node:fs";
import path from "node:path";
import request from "supertest";
import { beforeAll, describe, expect, it } from "vitest";
import { LINE_COLUMN, READING_COLUMNS, REFERENCE_COLUMN, TRAVERSE_COLUMNS } from "@/api-spec/records/importColumns";
import { importAnswer } from "@/api-spec/records/imports";
import { testDatabase } from "../support/accounts";
import { calculate } from "../support/api";
import { appMemory } from "../support/appMemory";
import { arrange, partner, type Partner } from "../support/records";

const template = (name: string): Buffer => readFileSync(path.join(import.meta.dirname, "../../examples/csv", name));

let app: Partner;
let projectId: string;
let instrumentId: string;
beforeAll(async () => {
  app = await partner();
  ({ projectId, instrumentId } = await arrange(app));
});

interface Sent {
  by?: Partner;
  query?: string;
  type?: string;
  headers?: Record<string, string>;
}

function send(file: string | Buffer, { by = app, query = "", type = "text/csv", headers = {} }: Sent = {}): request.Test {
  return request(process.env.AVERDUCT_TEST_URL!).post(`/api/v1/imports?${query}`).set("Authorization", `Bearer ${by.key}`).set({ "Content-Type": type, ...headers }).serialize((body: unknown) => body as string).send(file as never);
}
const check = async (file: string | Buffer, sent: Sent = {}) => importAnswer.parse((await send(file, { ...sent, query: `projectId=${projectId}&${sent.query ?? ""}` }).expect(200)).body);
const commit = (file: string | Buffer, sent: Sent = {}): request.Test => send(file, { ...sent, query: `mode=commit&projectId=${projectId}&${sent.query ?? ""}` });
const draftCount = async (by: Partner): Promise<number> => Number((await testDatabase()("traverses").where({ organisation_id: by.organisationId }).count({ count: "*" }))[0]!["count"]);

describe("the templates", () => {
  it.each(["row-per-traverse", "row-per-reading"] as const)("%s.csv: a dry run finds no fault and makes nothing; the commit makes what the API makes of the same fields", async (name) => {
    const by = await partner();
    const { projectId: project } = await arrange(by);
    const dry = importAnswer.parse((await send(template(`${name}.csv`), { by, query: `projectId=${project}` }).expect(200)).body);
    expect(dry).toMatchObject({ id: null, mode: "dry_run", faults: [], faultCount: 0, delimiter: "comma", form: name.replaceAll("-", "_"), createdAt: null });
    expect(dry.traverses.map(({ reference, id, readings }) => [reference, id, readings])).toEqual([["T1", null, 25], ["T2", null, 12], ["T3", null, 14]]);
    expect(await draftCount(by)).toBe(0);

    const made = importAnswer.parse((await send(template(`${name}.csv`), { by, query: `mode=commit&projectId=${project}` }).expect(200)).body);
    expect(made.traverses.map(({ id: _id, ...rest }) => rest)).toEqual(dry.traverses.map(({ id: _id, ...rest }) => rest));
    const stored = await Promise.all(made.traverses.map(async ({ id }) => (await by.send("get", `/traverses/${id}`).expect(200)).body));
    expect(stored[0]).toMatchObject({
      status: "draft", projectId: project, system: "AHU-1", technician: "R. Okonjo-Lindqvist", takenAt: "2026-11-20T14:05:00.000Z", holes: { count: 5, sealed: true, method: "plugs" },
      duct: { shape: "rectangular", measured: "outside", width: { value: 26, unit: "in" }, height: { value: 18, unit: "in" }, wall: { lining: { value: 1, unit: "in" } } },
      layout: "log_tchebycheff", enterFrom: "top", air: { relativeHumidity: { value: 85, unit: "percent" }, ductStaticPressure: { value: 1.2, unit: "in_wg" } },
      design: { airflow: { value: 3100, unit: "ft3/min" }, basis: "actual", tolerancePercent: 10 }, site: { downstream: { value: 13, unit: "ft" }, upstream: { value: 5, unit: "ft" } },
    });
    expect(stored[0].readings.lines[4]).toEqual([0.06, 0.073, 0.077, 0.074, 0.062]);
    expect(stored[2].readings.lines).toEqual([[840, 905, 918, 896, 832], [868, 941, null, 936, 861], [835, 902, 921, 899, 829]]);
    for (const [index, { airflow, percentOfDesign }] of made.traverses.entries()) {
      const { duct, readings, air, layout, site, design, units } = stored[index];
      const given = Object.fromEntries(Object.entries({ duct, readings, air, layout, site, design, units }).filter(([, value]) => value !== null));
      const { body } = await by.send("post", "/calculations/airflow", given).expect(200);
      expect(airflow).toEqual(body.airflow.actual);
      expect(percentOfDesign).toBe(body.design?.percent ?? null);
      expect(stored[index].result.airflow).toEqual(body.airflow);
    }
  });
});

/** A duct and its readings, as cells by heading. */
const ROUND = { traverse: "T1", duct_shape: "round", measured: "inside", diameter: "14", dimension_unit: "in", reading_kind: "velocity", reading_unit: "ft/min", line_1: "812 934 1010 1004 921 806", line_2: "798 926 1013 1009 930 811" };
const csv = (rows: Record<string, string>[], { delimiter = ",", end = "\n" } = {}): string => {
  const names = Object.keys(rows[0]!);
  return [names, ...rows.map((row) => names.map((name) => row[name] ?? ""))].map((cells) => cells.join(delimiter)).join(end);
};
const roundWith = (cells: Record<string, string>): string => csv([{ ...ROUND, ...cells }]);
/** By continuity: the mean of the twelve readings, 914.5 ft/min, times π/4 of (14 in)². */
const AIRFLOW = (914.5 * Math.PI * 14 ** 2) / (4 * 144);

describe("what spreadsheets do to a file", () => {
  const plain = roundWith({});
  const utf16 = (text: string, bigEndian = false): Buffer => {
    const bytes = Buffer.from(text, "utf16le");
    return bigEndian ? bytes.swap16() : bytes;
  };
  it.each<[string, string | Buffer, string?]>([
    ["nothing", plain],
    ["a byte order mark", `\uFEFF${plain}`],
    ["UTF-16 with its mark, tabs", utf16(`\uFEFF${csv([ROUND], { delimiter: "\t", end: "\r\n" })}`)],
    ["UTF-16 the other way round", utf16(`\uFEFF${plain}`, true)],
    ["UTF-16 without its mark", utf16(plain)],
    ["semicolons", csv([ROUND], { delimiter: ";" })],
    ["semicolons and decimal commas", csv([{ ...ROUND, diameter: "14,0", line_1: "812,0 934 1010 1004 921 806,0" }], { delimiter: ";" }), "decimalComma=true"],
    ["CRLF and an end of line at the end", `${csv([ROUND], { end: "\r\n" })}\r\n`],
    ["CR alone", csv([ROUND], { end: "\r" })],
    ["CRLF and LF mixed", `${csv([ROUND], { end: "\r\n" })}\n\r\n`],
    ["every cell in quotation marks", csv([Object.fromEntries(Object.entries(ROUND).map(([name, value]) => [`"${name}"`, `"${value}"`]))])],
    ["blank rows and empty columns at the end", csv([{}, ROUND, {}, {}].map((row) => ({ ...(Object.keys(row).length ? row : Object.fromEntries(Object.keys(ROUND).map((name) => [name, ""]))), "": "", " ": "" })))],
    ["headings in other case, with spaces and hyphens", plain.replace("duct_shape", " Duct Shape ").replace("dimension_unit", "DIMENSION-UNIT").replace("line_1", "Line 1")],
    ["names of units and kinds in other case", roundWith({ duct_shape: "Round", reading_unit: "FT/MIN", dimension_unit: "IN" })],
    ["spaces around cells, and no-break spaces between readings", roundWith({ diameter: " 14 ", line_2: " 798\u00a0926  1013 1009 930 811 " })],
    ["a line break and quotation marks inside a cell", roundWith({ notes: '"the ""north"" riser,\r\nsecond floor"' })],
  ])("%s: comes to the same airflow", async (_, file, query = "") => {
    const { faults, traverses } = await check(file, { query });
    expect(faults).toEqual([]);
    expect(traverses).toHaveLength(1);
    expect(traverses[0]!.airflow!.value).toBeCloseTo(AIRFLOW, 8);
  });

  it("another encoding is taken when it is named, and told of when it is not", async () => {
    const file = Buffer.from(roundWith({ location: '"Zone Süd, Küche"' }), "latin1");
    const { body } = await send(file, { query: `projectId=${projectId}` }).expect(422);
    expect(body.errors[0]).toMatchObject({ code: "encoding_not_readable" });
    expect((await check(file, { type: "text/csv; charset=windows-1252" })).traverses[0]!.location).toBe("Zone Süd, Küche");
    await send(file, { type: "text/csv; charset=klingon", query: `projectId=${projectId}` }).expect(422);
  });

  it("a decimal comma that was not declared is a fault, and so is a point where it was", async () => {
    const semicolons = csv([{ ...ROUND, diameter: "14,5" }], { delimiter: ";" });
    expect((await check(semicolons)).faults).toMatchObject([{ row: 2, column: "diameter", code: "not_a_number", detail: expect.stringContaining("decimalComma=true") }]);
    expect((await check(roundWith({ diameter: "14.5" }), { query: "decimalComma=true" })).faults).toMatchObject([{ row: 2, column: "diameter", code: "not_a_number" }]);
  });

  it("rows are numbered as a spreadsheet shows them, blank ones and cells of several lines counted right", async () => {
    const bad = { ...ROUND, traverse: "T2", diameter: "wide" };
    const file = csv([{ ...ROUND, notes: '"one\ntwo\nthree"' }, {}, bad].map((row) => ({ notes: "", ...Object.fromEntries(Object.keys(ROUND).map((name) => [name, ""])), ...row })));
    expect((await check(file)).faults).toMatchObject([{ row: 4, column: "diameter", code: "not_a_number" }]);
  });

  it("a formula is text, in what is stored and in the report", async () => {
    const by = await partner();
    const { projectId: project } = await arrange(by);
    const { body } = await send(roundWith({ location: '"=HYPERLINK(""http://x.example"",""y"")"', notes: "@SUM(A1)" }), { by, query: `mode=commit&projectId=${project}` }).expect(200);
    const { body: stored } = await by.send("get", `/traverses/${body.traverses[0].id}`).expect(200);
    expect([stored.location, stored.notes]).toEqual(['=HYPERLINK("http://x.example","y")', "@SUM(A1)"]);
  });
});

describe("a dry run names the row and column of", () => {
  it.each<[string, string, unknown]>([
    ["a number that is none", roundWith({ diameter: "14 in" }), { row: 2, column: "diameter", code: "not_a_number" }],
    ["a missing dimension", roundWith({ diameter: "" }), { row: 2, column: "diameter", code: "missing_cell" }],
    ["a missing unit", roundWith({ dimension_unit: "" }), { row: 2, column: "dimension_unit", code: "unit_missing" }],
    ["an unknown unit", roundWith({ dimension_unit: "inch" }), { row: 2, column: "dimension_unit", code: "not_known" }],
    ["a shape that is not known", roundWith({ duct_shape: "oblong" }), { row: 2, column: "duct_shape", code: "not_known" }],
    ["a missing shape", roundWith({ duct_shape: "" }), { row: 2, column: "duct_shape", code: "missing_cell" }],
    ["a dimension of another shape", roundWith({ width: "20" }), { row: 2, column: "width", code: "does_not_belong" }],
    ["an impossible dimension", roundWith({ diameter: "-14" }), { row: 2, column: "diameter" }],
    ["lining thicker than the duct", roundWith({ measured: "outside", lining: "9" }), { row: 2, code: "inside_dimension_not_positive" }],
    ["a bad reading, with its point", roundWith({ line_2: "798 926 1O13 1009 930 811" }), { row: 2, column: "line_2", code: "not_a_number", detail: expect.stringContaining("Point 3") }],
    ["a line left out", roundWith({ line_1: "" }), { row: 2, column: "line_1", code: "line_missing" }],
    ["readings without their kind", roundWith({ reading_kind: "" }), { row: 2, column: "reading_kind", code: "missing_cell" }],
    ["pressures in a unit of velocity", roundWith({ reading_kind: "velocity_pressure" }), { row: 2, column: "reading_unit" }],
    ["a time without an offset", roundWith({ taken_at: "20/11/2026 14:05" }), { row: 2, column: "taken_at", code: "invalid_format" }],
    ["holes without a word on their sealing", roundWith({ holes: "2" }), { row: 2, column: "holes_sealed", code: "missing_cell" }],
    ["density and temperature together", roundWith({ air_density: "0.07", air_density_unit: "lb/ft3", dry_bulb: "58", temperature_unit: "degF" }), { row: 2, code: "does_not_belong" }],
    ["humidity over 100 %", roundWith({ dry_bulb: "58", temperature_unit: "degF", relative_humidity_percent: "120" }), { row: 2, column: "relative_humidity_percent" }],
    ["an instrument that is not there", roundWith({ instrument_id: "ins_01kbc000000000000000000000" }), { row: 2, column: "instrument_id", code: "not_found" }],
    ["a project that is not there", roundWith({ project_id: "prj_01kbc000000000000000000000" }), { row: 2, column: "project_id", code: "not_found" }],
    ["an id that is none", roundWith({ instrument_id: "Micromanometer 2" }), { row: 2, column: "instrument_id", code: "invalid_format" }],
    ["a text that is too long", roundWith({ system: "x".repeat(121) }), { row: 2, column: "system", code: "too_large" }],
    ["a layout that is not for the shape", roundWith({ layout: "log_tchebycheff" }), { row: 2, column: "layout" }],
    ["a misspelt heading", roundWith({ desing_airflow: "100" }), { row: 1, column: "desing_airflow", code: "unknown_column" }],
    ["a heading twice", `${roundWith({})}`.replace("duct_shape", "measured"), { row: 1, column: "measured", code: "heading_repeated" }],
    ["a heading of the language's own", roundWith({ __proto: "x", constructor: "x" }), { row: 1, column: "constructor", code: "unknown_column" }],
    ["a cell beyond the headings", `${roundWith({})},stray`, { row: 2, column: null, code: "cell_without_heading" }],
    ["a quotation mark that is not closed", roundWith({ notes: '"north riser' }), { row: 2, column: null, code: "quote_not_closed" }],
    ["an inch mark in a bare cell", roundWith({ location: '14" main' }), { row: 2, column: null, code: "quote_misplaced" }],
    ["a traverse named twice", csv([ROUND, ROUND]), { row: 3, column: "traverse", code: "traverse_repeated" }],
    ["nothing at all", "", { row: 1, column: null, code: "no_rows" }],
    ["headings alone", "traverse,system\n", { row: 1, column: null, code: "no_rows" }],
  ])("%s", async (_, file, fault) => {
    const { faults } = await check(file);
    expect(faults.slice(0, 2)).toContainEqual(expect.objectContaining(fault as object));
  });

  it("a row without a project, where the request names none either", async () => {
    const { body } = await send(roundWith({}), {}).expect(200);
    expect(body.faults).toMatchObject([{ row: 2, column: "project_id", code: "missing_cell" }]);
  });

  it("everything at once", async () => {
    const file = csv([{ ...ROUND, diameter: "x", line_2: "1 y" }, { ...ROUND, traverse: "T2" }, { ...ROUND, traverse: "T3", dimension_unit: "", reading_unit: "knots" }]);
    const { faults, traverses } = await check(file);
    expect(faults.map(({ row, column }) => [row, column])).toEqual([[2, "diameter"], [2, "line_2"], [4, "dimension_unit"], [4, "reading_unit"]]);
    expect(traverses.map(({ airflow }) => airflow !== null)).toEqual([false, true, false]);
  });
});

describe("a file with a row for each reading", () => {
  const { line_1: _1, line_2: _2, ...described } = ROUND;
  const rows = (change: (rows: Record<string, string>[]) => void = () => {}): string => {
    const all = [ROUND.line_1, ROUND.line_2].flatMap((cell, line) => cell.split(" ").map((reading, point) => ({ traverse: "T1", line: String(line + 1), point: String(point + 1), reading }) as Record<string, string>));
    Object.assign(all[0]!, described);
    change(all);
    return csv([{ ...Object.fromEntries(["traverse", "line", "point", "reading", ...Object.keys(described)].map((name) => [name, ""])), ...all[0] }, ...all.slice(1)]);
  };

  it("comes to the same in any order of its points, and with its description repeated", async () => {
    for (const file of [rows(), rows((all) => all.splice(1, all.length - 1, ...all.slice(1).reverse())), rows((all) => all.forEach((row) => Object.assign(row, described)))]) {
      const { faults, traverses } = await check(file);
      expect(faults).toEqual([]);
      expect(traverses[0]!.airflow!.value).toBeCloseTo(AIRFLOW, 8);
    }
  });

  it.each<[string, (all: Record<string, string>[]) => void, object]>([
    ["a row that was forgotten", (all) => all.splice(3, 1), { row: 2, column: "point", code: "point_missing" }],
    ["a point given twice", (all) => Object.assign(all[4]!, { point: "4" }), { row: 6, column: "point", code: "point_repeated" }],
    ["a reading that is none", (all) => Object.assign(all[4]!, { reading: "n/a" }), { row: 6, column: "reading", code: "not_a_number" }],
    ["a line of 0", (all) => Object.assign(all[4]!, { line: "0" }), { row: 6, column: "line", code: "not_a_count" }],
    ["no traverse", (all) => Object.assign(all[4]!, { traverse: "" }), { row: 6, column: "traverse", code: "missing_cell" }],
    ["another diameter further down", (all) => Object.assign(all[4]!, { diameter: "15" }), { row: 6, column: "diameter", code: "differs_from_first_row" }],
    ["a negative velocity, refused where it is to be", (all) => { Object.assign(all[0]!, { negative_readings: "reject" }); Object.assign(all[4]!, { reading: "-20" }); }, { row: 6, column: "reading" }],
  ])("%s is told of at its row", async (_, change, fault) => {
    expect((await check(rows(change))).faults).toContainEqual(expect.objectContaining(fault));
  });

  it("an empty reading is a point that could not be read", async () => {
    const { faults, traverses } = await check(rows((all) => Object.assign(all[4]!, { reading: "" })));
    expect([faults, traverses[0]!.readings]).toEqual([[], 11]);
  });
});

describe("a commit", () => {
  const good = (count: number): Record<string, string>[] => Array.from({ length: count }, (_, index) => ({ ...ROUND, traverse: `R${index + 1}` }));

  it("makes nothing where the last row of many is bad, and says where", async () => {
    const by = await partner();
    const { projectId: project } = await arrange(by);
    const { body } = await send(csv([...good(300), { ...ROUND, traverse: "last", line_2: "798 9z6" }]), { by, query: `mode=commit&projectId=${project}` }).expect(422);
    expect(body.type).toContain("import-has-faults");
    expect(body.errors).toMatchObject([{ pointer: "", row: 302, column: "line_2", code: "not_a_number" }]);
    expect(await draftCount(by)).toBe(0);
    expect((await by.send("get", "/imports").expect(200)).body.items).toEqual([]);
  });

  it("is done once: with the same Idempotency-Key, with the same file, and by several at once", async () => {
    const by = await partner();
    const { projectId: project } = await arrange(by);
    const query = `mode=commit&projectId=${project}&name=plant+room.csv`;
    const headers = { "Idempotency-Key": "import-1" };
    const first = await send(csv(good(5)), { by, query, headers }).expect(200);
    const again = await send(csv(good(5)), { by, query, headers }).expect(200);
    expect([again.headers["idempotency-replayed"], again.text]).toEqual(["true", first.text]);
    const without = await send(csv(good(5)), { by, query }).expect(200);
    expect(without.body).toEqual({ ...first.body, repeated: true });
    expect(await draftCount(by)).toBe(5);

    const answers = await Promise.all(Array.from({ length: 5 }, () => send(csv(good(7)), { by, query })));
    expect(answers.map(({ status }) => status)).toEqual([200, 200, 200, 200, 200]);
    expect(new Set(answers.map(({ body }) => JSON.stringify(body.traverses))).size).toBe(1);
    expect(answers.filter(({ body }) => !body.repeated)).toHaveLength(1);
    expect(await draftCount(by)).toBe(12);

    const { body: list } = await by.send("get", "/imports?limit=1").expect(200);
    expect(list.items).toMatchObject([{ name: "plant room.csv", rows: 7, traverses: 7 }]);
    const { body: older } = await by.send("get", `/imports?after=${list.next}`).expect(200);
    expect(older.items).toMatchObject([{ id: first.body.id, rows: 5 }]);
    expect((await by.send("get", `/imports/${first.body.id}`).expect(200)).body).toEqual(first.body);
  });

  it("refuses the same Idempotency-Key for a commit after a dry run", async () => {
    const headers = { "Idempotency-Key": "import-dry-then-commit" };
    await send(csv(good(1)), { query: `projectId=${projectId}`, headers }).expect(200);
    expect((await commit(csv(good(1)), { headers }).expect(422)).body.type).toContain("idempotency-key-reused");
  });

  it("makes the same file anew in another project, for another organisation, and once all its drafts were deleted", async () => {
    const by = await partner();
    const { projectId: project } = await arrange(by);
    const query = `mode=commit&projectId=${project}`;
    const first = await send(csv(good(2)), { by, query }).expect(200);
    const other = await partner({ organisationId: by.organisationId, environment: "production" });
    const elsewhere = await arrange(other);
    expect((await send(csv(good(2)), { by: other, query: `mode=commit&projectId=${elsewhere.projectId}` }).expect(200)).body.repeated).toBe(false);
    await other.send("get", `/imports/${first.body.id}`).expect(404);
    expect((await other.send("get", "/imports").expect(200)).body.items).toHaveLength(1);

    await by.send("delete", `/traverses/${first.body.traverses[0].id}`).expect(204);
    expect((await send(csv(good(2)), { by, query }).expect(200)).body).toMatchObject({ repeated: true, id: first.body.id });
    await by.send("delete", `/traverses/${first.body.traverses[1].id}`).expect(204);
    const anew = await send(csv(good(2)), { by, query }).expect(200);
    expect([anew.body.repeated, anew.body.id !== first.body.id]).toEqual([false, true]);
  });

  it("takes the instrument as it was on the day, as a draft made by itself does", async () => {
    const { body } = await commit(csv([{ ...ROUND, instrument_id: instrumentId, taken_at: "2026-11-20T14:05:00Z" }])).expect(200);
    const { body: stored } = await app.send("get", `/traverses/${body.traverses[0].id}`).expect(200);
    expect(stored.instrument.calibration.certificateNumber).toBe("SM-2213");
    expect(stored.result.airflow.actual).toEqual(body.traverses[0].airflow);
  });

  it("needs the scope to write, a project that is there, and text/csv", async () => {
    const reader = await partner({ organisationId: app.organisationId, scopes: ["records:read"] });
    await send(csv(good(1)), { by: reader }).expect(403);
    const { body } = await send(csv(good(1)), { query: "projectId=prj_01kbc000000000000000000000" }).expect(422);
    expect(body.errors).toMatchObject([{ parameter: "projectId", code: "not_found" }]);
    expect((await send(csv(good(1)), { type: "application/json" }).expect(415)).headers["accept"]).toBe("text/csv");
    await send(csv(good(1)), { query: "colour=red" }).expect(422);
  });
});

describe("a file made to harm", () => {
  const within = async (milliseconds: number, work: () => Promise<unknown>): Promise<void> => {
    const begin = performance.now();
    await work();
    expect(performance.now() - begin).toBeLessThan(milliseconds);
  };
  it.each<[string, () => string, string]>([
    ["a row of two million empty cells", () => `${roundWith({})}\n${",".repeat(2_000_000)}x`, "too_many_columns"],
    ["half a million rows of empty cells", () => `${roundWith({})}\n${",,\n".repeat(500_000)}`, "too_many_rows"],
    ["a quoted cell of four megabytes", () => `${roundWith({})}\n"${"x".repeat(4_000_000)}"`, "row_too_long"],
    ["201 columns", () => csv([Object.fromEntries(Array.from({ length: 201 }, (_, index) => [`line_${index + 1}`, "1"]))]), "too_many_columns"],
    ["5,001 rows", () => csv(Array.from({ length: 5_001 }, () => ({ system: "AHU-1" }))), "too_many_rows"],
    ["a cell of 20,000 characters", () => roundWith({ notes: "x".repeat(20_000) }), "cell_too_long"],
    ["1,001 readings", () => roundWith({ line_1: "1 ".repeat(1_001) }), "too_many_points"],
    ["a heading of 100,000 letters", () => `${"x".repeat(100_000)}\n1`, "unknown_column"],
  ])("%s is refused without much ado", (_, file, code) =>
    within(5_000, async () => {
      const { faults } = await check(file());
      expect(faults.map((fault) => fault.code)).toContain(code);
    }));

  it("six megabytes are too large", async () => {
    await send("x".repeat(6 * 1024 ** 2)).expect(413);
  });

  it("only the first thousand faults are listed, and all are counted", async () => {
    const { faults, faultCount } = await check(csv(Array.from({ length: 1_500 }, (_, index) => ({ ...ROUND, traverse: `B${index}`, diameter: "x" }))));
    expect([faults.length, faultCount]).toEqual([1_000, 1_500]);
  });
});

describe("a file of 5,000 traverses with 25 readings each", () => {
  const [headings, first] = template("row-per-traverse.csv").toString().split("\r\n") as [string, string];
  const file = [headings, ...Array.from({ length: 5_000 }, (_, index) => first.replace("T1", `N${index + 1}`))].join("\r\n");

  it.each(["dry_run", "commit"])("%s: is done whole, and others are answered meanwhile", async (mode) => {
    let [slowest, most, answered, done] = [0, 0, 0, false];
    const before = appMemory();
    const others = (async () => {
      while (!done) {
        const begin = performance.now();
        await calculate("duct-area", app.key, { duct: { shape: "round", measured: "inside", diameter: { value: 14, unit: "in" } } }).expect(200);
        slowest = Math.max(slowest, performance.now() - begin);
        answered += 1;
        most = Math.max(most, appMemory());
        await new Promise((resolve) => setTimeout(resolve, 50));
      }
    })();
    const begin = performance.now();
    const { body } = await send(file, { query: `mode=${mode}&projectId=${projectId}`, headers: { "Idempotency-Key": `five-thousand-${mode}` } }).expect(200);
    const seconds = (performance.now() - begin) / 1_000;
    done = true;
    await others;
    console.log(`${mode}: ${(file.length / 1024 ** 2).toFixed(1)} MiB in ${seconds.toFixed(1)} s; memory ${before.toFixed(0)} MiB before, ${most.toFixed(0)} at most; slowest other answer ${slowest.toFixed(0)} ms`);
    expect([body.rows, body.faultCount, body.traverses.length]).toEqual([5_000, 0, 5_000]);
    expect(new Set(body.traverses.map(({ id }: { id: string | null }) => id)).size).toBe(mode === "commit" ? 5_000 : 1);
    expect(answered).toBeGreaterThan(5);
  }, 240_000);
});

describe("the columns", () => {
  it("are documented in the templates' README with the words of the contract", async () => {
    const readme = template("README.md").toString();
    for (const { name, words } of [REFERENCE_COLUMN, ...TRAVERSE_COLUMNS, LINE_COLUMN, ...READING_COLUMNS]) expect(readme).toContain(`| \`${name}\` | ${words} |`);
    for (const { name } of TRAVERSE_COLUMNS.filter(({ at }) => !at)) expect(TRAVERSE_COLUMNS.some(({ cell }) => cell.is === "quantity" && cell.unit === name), name).toBe(true);
  });
});
