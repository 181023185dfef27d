import { stringify } from "csv-stringify/sync";
import { EXPORT_COLUMNS, type ExportColumn } from "@/api-spec/records/exports";
import type { Traverse } from "../traverses/answer";

type Cell = string | number | boolean | null | undefined;
type Quantity = { value: number; unit: string } | null | undefined;

const COLUMNS = Object.keys(EXPORT_COLUMNS) as ExportColumn[];
/** What makes a spreadsheet take text for a formula; the wide forms of the signs are folded into the narrow ones by some. */
const FORMULA = /^[=+\-@＝＋－＠\t\r\n]/;
const PLAIN_NUMBER = /^[+-]?\d+(\.\d+)?$/;

/** Text that no spreadsheet takes for a formula. */
export const harmless = (text: string): string => (FORMULA.test(text) && !PLAIN_NUMBER.test(text) ? `'${text}` : text);

/** Traverses as rows of CSV. */
export const csvRows = (traverses: Traverse[]): string => write(traverses.map((traverse) => {
  const cells = cellsOf(traverse);
  return COLUMNS.map((name) => cells[name]);
}));

/** The row of headings. */
export const csvHeadings = (): string => write([COLUMNS]);

const write = (rows: Cell[][]): string => stringify(rows, { record_delimiter: "\r\n", cast: { string: harmless, boolean: String } });

const withUnit = <Name extends string>(name: Name, quantity: Quantity) =>
  ({ [name]: quantity?.value, [`${name}_unit`]: quantity?.unit }) as Record<Name | `${Name}_unit`, Cell>;

function cellsOf(traverse: Traverse): Record<ExportColumn, Cell> {
  const { instrument, holes, voided } = traverse;
  return {
    id: traverse.id,
    status: traverse.status,
    revision: traverse.revision,
    supersedes: traverse.supersedes,
    superseded_by: traverse.supersededBy,
    project_id: traverse.projectId,
    system: traverse.system,
    location: traverse.location,
    technician: traverse.technician,
    taken_at: traverse.takenAt,
    instrument_id: traverse.instrumentId,
    instrument: instrument?.name,
    instrument_serial_number: instrument?.serialNumber,
    ...ductCells(traverse.duct),
    layout: traverse.layout,
    reading_kind: traverse.readings?.kind,
    ...resultCells(traverse),
    holes: holes?.count,
    holes_sealed: holes?.sealed,
    notes: traverse.notes,
    engine_version: traverse.engineVersion,
    issued_at: traverse.issuedAt,
    voided_at: voided?.at,
    void_reason: voided?.reason,
    created_at: traverse.createdAt,
    updated_at: traverse.updatedAt,
  };
}

function ductCells(duct: Traverse["duct"]) {
  const { width, height, diameter, major, minor } = { ...duct } as Partial<Record<"width" | "height" | "diameter" | "major" | "minor", Quantity>>;
  return {
    duct_shape: duct?.shape,
    measured: duct?.measured,
    ...withUnit("width", width),
    ...withUnit("height", height),
    ...withUnit("diameter", diameter),
    ...withUnit("major", major),
    ...withUnit("minor", minor),
    ...withUnit("wall_thickness", duct?.wall?.thickness),
    ...withUnit("lining", duct?.wall?.lining),
  };
}

function resultCells({ result, design }: Traverse) {
  return {
    points: result?.statistics.count,
    points_skipped: result?.statistics.skipped,
    ...withUnit("area", result?.area),
    ...withUnit("air_density", result?.air.density),
    ...withUnit("average_velocity", result?.averageVelocity),
    ...withUnit("airflow", result?.airflow.actual),
    ...withUnit("standard_airflow", result?.airflow.standard),
    ...withUnit("mass_flow", result?.airflow.mass),
    uncertainty_percent: result?.uncertainty.expandedPercent,
    ...withUnit("design_airflow", design?.airflow),
    design_basis: result?.design?.basis ?? design?.basis,
    percent_of_design: result?.design?.percent,
    design_tolerance_percent: result?.design?.tolerancePercent ?? design?.tolerancePercent,
    verdict: result?.design?.verdict,
    failed_checks: result?.checks.filter(({ passed }) => !passed).map(({ code }) => code).join(" "),
  };
}
