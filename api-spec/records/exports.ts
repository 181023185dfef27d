import { z } from "zod";
import { defineOperation } from "../define";
import { traverseFilters } from "./traverses";

const withUnit = <Name extends string>(name: Name, words: string) => ({ [name]: words, [`${name}_unit`]: `Unit of ${name}.` }) as Record<Name | `${Name}_unit`, string>;

/** The columns of an export as CSV, in their order. */
export const EXPORT_COLUMNS = {
  id: "The traverse.",
  status: "`draft`, `issued`, `superseded` or `void`.",
  revision: "1, and one more for each revision.",
  supersedes: "The record that it superseded.",
  superseded_by: "The record that superseded it.",
  project_id: "The project.",
  system: "The air system.",
  location: "Where on the system the plane lies.",
  technician: "Who took it.",
  taken_at: "When, in UTC.",
  instrument_id: "The instrument.",
  instrument: "Its name.",
  instrument_serial_number: "Its serial number.",
  duct_shape: "`rectangular`, `round` or `flat_oval`.",
  measured: "Where the dimensions were measured: `inside` or `outside`.",
  ...withUnit("width", "Rectangular: side to side."),
  ...withUnit("height", "Rectangular: top to bottom."),
  ...withUnit("diameter", "Round: across the duct."),
  ...withUnit("major", "Flat oval: the longer axis."),
  ...withUnit("minor", "Flat oval: the shorter axis."),
  ...withUnit("wall_thickness", "Between outside and inside."),
  ...withUnit("lining", "Lining inside it."),
  layout: "The rule that placed the points.",
  reading_kind: "`velocity_pressure` or `velocity`.",
  points: "Points in the average.",
  points_skipped: "Points that could not be read.",
  ...withUnit("area", "Inside area of the duct."),
  ...withUnit("air_density", "Density of the air in the duct."),
  ...withUnit("average_velocity", "Mean of the velocities at the points."),
  ...withUnit("airflow", "Actual airflow."),
  ...withUnit("standard_airflow", "Airflow at the density of standard air."),
  ...withUnit("mass_flow", "Mass flow."),
  uncertainty_percent: "Expanded uncertainty of the airflow, k = 2.",
  ...withUnit("design_airflow", "What the duct is meant to carry."),
  design_basis: "Which airflow the design means: `actual` or `standard`.",
  percent_of_design: "Measured over design.",
  design_tolerance_percent: "Allowed difference.",
  verdict: "`within`, `outside` or `undecided`.",
  failed_checks: "Codes of the checks that were not passed, with spaces between them.",
  holes: "How many holes were drilled.",
  holes_sealed: "`true` when all of them were sealed.",
  notes: "As written.",
  engine_version: "Version of the engine that made the result.",
  issued_at: "When it was issued, in UTC.",
  voided_at: "When it was withdrawn, in UTC.",
  void_reason: "Why.",
  created_at: "When it was made, in UTC.",
  updated_at: "When it was last changed, in UTC.",
} as const;
export type ExportColumn = keyof typeof EXPORT_COLUMNS;

export const exportQuery = z.strictObject({
  format: z.enum(["csv", "ndjson"]).default("csv").describe("`csv`: one row a traverse. `ndjson`: one line a traverse, as `GET /traverses/{id}` answers with it."),
  ...traverseFilters,
});

export const exportTraverses = defineOperation({
  id: "exportTraverses", method: "get", path: "/exports/traverses", tag: "Imports and exports", scope: "records:read",
  summary: "Export traverses",
  description: `All traverses that the filters of the list leave, the first made first, sent while they are read, however many there are. Should something fail midway, the connection breaks off: an export that ends as HTTP has it, is whole.

CSV is in UTF-8 as RFC 4180 has it. Numbers are not rounded and have a decimal point; what is not known is empty. Text that a spreadsheet would take for a formula is given with an apostrophe before it.

| column | |
| --- | --- |
${Object.entries(EXPORT_COLUMNS).map(([name, words]) => `| \`${name}\` | ${words} |`).join("\n")}`,
  query: exportQuery,
  answer: z.string(),
  media: ["text/csv", "application/x-ndjson"],
});
