import { AirflowInputError, type Path } from "../errors";
import type { Duct, Readings } from "../types";
import { UNITS, type PressureUnit, type Quantity, type QuantityKind, type QuantityOf, type VelocityUnit } from "../units/units";
import { halfStep } from "./rounding";
import { DIMENSIONS, FIGURES, type DimensionName, type FigureName } from "./slip";

/** What somebody reported. Every part may be left out. */
export interface Reported {
  /** Sum of the readings, or of the velocities found from velocity pressures: whichever it is nearer to. */
  total?: number;
  count?: number;
  /** A velocity; for velocity pressures it may also be their mean, a pressure. */
  average?: Quantity<VelocityUnit | PressureUnit>;
  /** Inside dimensions as they were used. */
  dimensions?: Partial<Record<DimensionName, QuantityOf<"length">>>;
  area?: QuantityOf<"area">;
  airflow?: QuantityOf<"airflow">;
  /** Which airflow was reported; actual when left out. */
  basis?: "actual" | "standard";
}

/** One reported figure, with what its digits can tell. */
export interface ReportedFigure {
  figure: FigureName;
  /** As reported, in its unit. */
  value: number;
  unit: string | null;
  /** SI value of one of its unit; 1 for a total or a count. */
  factor: number;
  /** Half the step of the last digit, in its unit. */
  rounding: number;
}
export type ReportedFigures = Partial<Record<FigureName, ReportedFigure>>;

/** A total's unit is settled once the readings have been added up. */
export interface TotalUnit {
  unit: string;
  factor: number;
}

const quantityFigure = (figure: FigureName, kind: QuantityKind, { value, unit }: Quantity): ReportedFigure => ({
  figure,
  value,
  unit,
  factor: (UNITS[kind] as Record<string, { factor: number }>)[unit]!.factor,
  rounding: halfStep(value, false),
});

const isPressure = (unit: string): boolean => unit in UNITS.pressure;

/**
 * The reported figures that can be compared, by name. Without a duct a reported area is taken as given.
 * @throws {AirflowInputError} Nothing was reported, or something that the readings and the duct cannot be compared with.
 */
export function reportedFigures(reported: Reported, readings: Readings, duct: Duct | undefined, totalUnit: TotalUnit): ReportedFigures {
  refuseIncomparable(reported, readings, duct);
  const { total, count, average, dimensions, area, airflow } = reported;
  const figures: ReportedFigures = {};
  if (total !== undefined) figures.total = { figure: "total", value: total, ...totalUnit, rounding: halfStep(total, true) };
  if (count !== undefined) figures.count = { figure: "count", value: count, unit: null, factor: 1, rounding: 0 };
  if (average) figures.average = quantityFigure("average", isPressure(average.unit) ? "pressure" : "velocity", average);
  for (const name of DIMENSIONS) {
    const dimension = dimensions?.[name];
    if (dimension) figures[name] = quantityFigure(name, "length", dimension);
  }
  if (area && duct) figures.area = quantityFigure("area", "area", area);
  if (airflow) figures.airflow = quantityFigure("airflow", "airflow", airflow);
  return figures;
}

/** The reported figures in the order they are worked out. */
export const inOrder = (figures: ReportedFigures): ReportedFigure[] => FIGURES.flatMap((name) => figures[name] ?? []);

function refuseIncomparable({ total, count, average, dimensions, area, airflow }: Reported, readings: Readings, duct: Duct | undefined): void {
  const refuse = (path: Path, code: string, detail: string): never => {
    throw new AirflowInputError({ path: ["reported", ...path], code, detail });
  };
  if (total === undefined && count === undefined && !average && Object.keys(dimensions ?? {}).length === 0 && !area && !airflow) {
    refuse([], "nothing_reported", "Nothing was reported, so there is nothing to compare. Give a total, a count, an average, dimensions, an area or an airflow.");
  }
  if (average && isPressure(average.unit) && readings.kind === "velocity") refuse(["average", "unit"], "unit_not_comparable", "The readings are velocities, so their average is one too.");
  if (airflow && !duct && !area) refuse(["airflow"], "duct_needed", "An airflow can be recomputed only with the duct, or with a reported area to take as given.");
  for (const [name, quantity] of Object.entries({ average, area, airflow })) {
    if (quantity && !(quantity.value >= 0)) refuse([name], "figure_negative", `The reported ${name} is below 0.`);
  }
  for (const name of DIMENSIONS) {
    if (dimensions?.[name] && !(duct && name in duct)) refuse(["dimensions", name], "dimension_not_comparable", `The duct has no ${name} to compare with.`);
  }
  if (area && !duct && !(area.value > 0)) refuse(["area"], "area_not_positive", "Without a duct the area is taken as given, so it must be above 0.");
}
