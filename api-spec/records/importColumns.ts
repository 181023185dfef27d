import type { QuantityKind } from "@/lib/airflow/units/units";

/** What a cell of an import holds. A quantity's unit stands in a column of its own, which several quantities may share. */
export type CellKind =
  | { is: "text" | "number" | "count" | "yes_or_no" }
  | { is: "quantity"; unit: string }
  | { is: "percent" }
  | { is: "choice"; of: readonly string[] }
  | { is: "unit"; of: readonly QuantityKind[] };

export interface ImportColumn {
  /** The heading: case, and spaces or hyphens for underscores, do not matter. */
  name: string;
  cell: CellKind;
  /** Place in the fields of a traverse; a unit that goes with quantities has none of its own. */
  at?: readonly string[];
  words: string;
}

const text = { is: "text" } as const;
const number = { is: "number" } as const;
const count = { is: "count" } as const;
const choice = (...of: string[]): CellKind => ({ is: "choice", of });
const unit = (...of: QuantityKind[]): CellKind => ({ is: "unit", of });
const quantity = (name: string): CellKind => ({ is: "quantity", unit: name });
const dimension = quantity("dimension_unit");
const temperature = quantity("temperature_unit");
const straight = quantity("straight_unit");

/** What describes a traverse, in both forms of file. In the one with a row for each reading it stands in the traverse's first row. */
export const TRAVERSE_COLUMNS: readonly ImportColumn[] = [
  { name: "project_id", at: ["projectId"], cell: text, words: "The project, `prj_…`. Where it is empty, the `projectId` of the request." },
  { name: "instrument_id", at: ["instrumentId"], cell: text, words: "The instrument, `ins_…`." },
  { name: "system", at: ["system"], cell: text, words: "The air system, e.g. AHU-1." },
  { name: "location", at: ["location"], cell: text, words: "Where on the system the plane lies." },
  { name: "technician", at: ["technician"], cell: text, words: "Who took it." },
  { name: "taken_at", at: ["takenAt"], cell: text, words: "When, in ISO 8601 with its offset, e.g. 2026-11-20T14:05:00Z or 2026-11-20T09:05:00-05:00." },
  { name: "notes", at: ["notes"], cell: text, words: "Anything else, up to 4,000 characters, over several lines where the cell is quoted." },
  { name: "holes", at: ["holes", "count"], cell: count, words: "How many holes were drilled." },
  { name: "holes_sealed", at: ["holes", "sealed"], cell: { is: "yes_or_no" }, words: "`yes` when all of them were sealed, else `no`." },
  { name: "hole_method", at: ["holes", "method"], cell: text, words: "With what they were sealed." },
  { name: "calibration_waiver", at: ["calibrationWaiver", "reason"], cell: text, words: "Why the traverse may be issued though no instrument was in calibration." },
  { name: "duct_shape", at: ["duct", "shape"], cell: choice("rectangular", "round", "flat_oval"), words: "`rectangular`, `round` or `flat_oval`." },
  { name: "measured", at: ["duct", "measured"], cell: choice("inside", "outside"), words: "Where the dimensions were measured: `inside` or `outside`." },
  { name: "width", at: ["duct", "width"], cell: dimension, words: "Rectangular: side to side." },
  { name: "height", at: ["duct", "height"], cell: dimension, words: "Rectangular: top to bottom." },
  { name: "diameter", at: ["duct", "diameter"], cell: dimension, words: "Round: across the duct." },
  { name: "major", at: ["duct", "major"], cell: dimension, words: "Flat oval: the longer axis." },
  { name: "minor", at: ["duct", "minor"], cell: dimension, words: "Flat oval: the shorter axis." },
  { name: "wall_thickness", at: ["duct", "wall", "thickness"], cell: dimension, words: "Sheet metal or board between outside and inside." },
  { name: "lining", at: ["duct", "wall", "lining"], cell: dimension, words: "Lining inside it." },
  { name: "dimension_unit", cell: unit("length"), words: "Unit of all the dimensions of duct and probe: `in`, `ft`, `mm`, `cm` or `m`." },
  { name: "layout", at: ["layout"], cell: choice("log_tchebycheff", "log_linear", "equal_area", "method_1"), words: "The rule that placed the points: `log_tchebycheff`, `log_linear`, `equal_area` or `method_1`." },
  { name: "points_across", at: ["points", "across"], cell: count, words: "Points planned along the width, where not the rule's minimum." },
  { name: "points_down", at: ["points", "down"], cell: count, words: "Points planned down the height." },
  { name: "points_per_diameter", at: ["points", "perDiameter"], cell: count, words: "Round: points planned on each diameter." },
  { name: "diameters", at: ["points", "diameters"], cell: count, words: "Round: 2 or 3." },
  { name: "enter_from", at: ["enterFrom"], cell: choice("top", "bottom", "left", "right"), words: "Face with the holes, looking in the direction of the flow: `top`, `bottom`, `left` or `right`." },
  { name: "dry_bulb", at: ["air", "dryBulb"], cell: temperature, words: "Temperature of the air in the duct." },
  { name: "wet_bulb", at: ["air", "wetBulb"], cell: temperature, words: "One form of humidity at most." },
  { name: "dew_point", at: ["air", "dewPoint"], cell: temperature, words: "One form of humidity at most." },
  { name: "temperature_unit", cell: unit("temperature"), words: "Unit of the temperatures: `degF`, `degC` or `K`." },
  { name: "relative_humidity_percent", at: ["air", "relativeHumidity"], cell: { is: "percent" }, words: "In percent. One form of humidity at most." },
  { name: "humidity_ratio", at: ["air", "humidityRatio"], cell: number, words: "Mass of water vapour per mass of dry air. One form of humidity at most." },
  { name: "altitude", at: ["air", "altitude"], cell: quantity("altitude_unit"), words: "Above sea level; either this or the barometric pressure." },
  { name: "altitude_unit", cell: unit("length"), words: "`ft` or `m`, or another unit of length." },
  { name: "barometric_pressure", at: ["air", "barometricPressure"], cell: quantity("barometric_pressure_unit"), words: "Station pressure, not reduced to sea level." },
  { name: "barometric_pressure_unit", cell: unit("pressure"), words: "`inHg`, `kPa`, `hPa`, `mbar`, `Pa`, `psi` or `in_wg`." },
  { name: "duct_static_pressure", at: ["air", "ductStaticPressure"], cell: quantity("duct_static_pressure_unit"), words: "Gauge pressure in the duct, below 0 on the suction side." },
  { name: "duct_static_pressure_unit", cell: unit("pressure"), words: "A unit of pressure, as above." },
  { name: "air_density", at: ["air", "density"], cell: quantity("air_density_unit"), words: "Where the density is known; then none of the other columns of the air." },
  { name: "air_density_unit", cell: unit("density"), words: "`lb/ft3` or `kg/m3`." },
  { name: "standard_air", at: ["standardAir"], cell: choice("ashrae", "iso", "epa", "normal"), words: "`ashrae`, `iso`, `epa` or `normal`." },
  { name: "probe_coefficient", at: ["probe", "coefficient"], cell: number, words: "1 when left out, or the instrument's own." },
  { name: "probe_diameter", at: ["probe", "diameter"], cell: dimension, words: "Of the stem." },
  { name: "probe_length", at: ["probe", "length"], cell: dimension, words: "Usable length." },
  { name: "straight_downstream", at: ["site", "downstream"], cell: straight, words: "Straight length from the last disturbance to the plane." },
  { name: "straight_upstream", at: ["site", "upstream"], cell: straight, words: "Straight length from the plane to the next disturbance." },
  { name: "straight_unit", cell: unit("length"), words: "Unit of the straight lengths." },
  { name: "design_airflow", at: ["design", "airflow"], cell: quantity("design_airflow_unit"), words: "What the duct is meant to carry." },
  { name: "design_airflow_unit", cell: unit("airflow"), words: "`ft3/min`, `L/s`, `m3/s` or `m3/h`." },
  { name: "design_basis", at: ["design", "basis"], cell: choice("actual", "standard"), words: "`actual` (when left out) or `standard`." },
  { name: "design_tolerance_percent", at: ["design", "tolerancePercent"], cell: number, words: "10 when left out." },
  { name: "negative_readings", at: ["negativeReadings"], cell: choice("count_as_zero", "reject"), words: "`count_as_zero` (when left out) or `reject`." },
  { name: "units", at: ["units"], cell: choice("ip", "si"), words: "Units of the result: `ip` (when left out) or `si`." },
  { name: "reading_kind", at: ["readings", "kind"], cell: choice("velocity_pressure", "velocity"), words: "What was read: `velocity_pressure` or `velocity`." },
  { name: "reading_unit", at: ["readings", "unit"], cell: unit("pressure", "velocity"), words: "Unit of the readings, e.g. `in_wg`, `Pa`, `ft/min`, `m/s`." },
];

/** The name by which a file tells its traverses apart. */
export const REFERENCE_COLUMN: ImportColumn = { name: "traverse", cell: text, words: "Your own name or number of the traverse, shown in the report. Needed in a file with a row for each reading; each name stands for one traverse." };

/** The columns of readings in a file with a row for each reading. */
export const READING_COLUMNS: readonly ImportColumn[] = [
  { name: "line", cell: count, words: "Which hole or line, counted from 1." },
  { name: "point", cell: count, words: "Which point on it, counted from 1 in the order read." },
  { name: "reading", cell: number, words: "What was read; empty for a point that could not be read." },
];

/** The columns of readings in a file with a row for each traverse: one a line. */
export const LINE_COLUMN: ImportColumn = { name: "line_1", cell: text, words: "The readings of the first hole or line in the order read, with spaces between them; `-` for a point that could not be read. `line_2`, `line_3` and so on for the others." };
