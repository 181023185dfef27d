import type { QuantityOf, UnitSystem, PressureUnit, VelocityUnit } from "./units/units";

/** What a caller may describe; the shapes of the API's requests, and nothing that HTTP adds. */

export interface Wall {
  /** Sheet metal or board. */
  thickness?: QuantityOf<"length">;
  lining?: QuantityOf<"length">;
}
interface DuctMeasurement {
  measured: "inside" | "outside";
  wall?: Wall;
}
export interface RectangularDuct extends DuctMeasurement {
  shape: "rectangular";
  width: QuantityOf<"length">;
  height: QuantityOf<"length">;
}
export interface RoundDuct extends DuctMeasurement {
  shape: "round";
  diameter: QuantityOf<"length">;
}
export interface FlatOvalDuct extends DuctMeasurement {
  shape: "flat_oval";
  major: QuantityOf<"length">;
  minor: QuantityOf<"length">;
}
export type Duct = RectangularDuct | RoundDuct | FlatOvalDuct;

export interface AirState {
  dryBulb: QuantityOf<"temperature">;
  relativeHumidity?: QuantityOf<"ratio">;
  wetBulb?: QuantityOf<"temperature">;
  dewPoint?: QuantityOf<"temperature">;
  /** Mass of water vapour per mass of dry air, a bare number. */
  humidityRatio?: number;
  altitude?: QuantityOf<"length">;
  barometricPressure?: QuantityOf<"pressure">;
  ductStaticPressure?: QuantityOf<"pressure">;
}
export interface KnownDensity {
  density: QuantityOf<"density">;
}
export type Air = AirState | KnownDensity;

export type StandardAirName = "ashrae" | "iso" | "epa" | "normal";

/** One inner list for each hole or line, in the order read; null for a point that could not be read. */
export type ReadingLines = (number | null)[][];
interface ReadingLayout {
  lines: ReadingLines;
  /** For custom layouts: the weight of each point, in the shape of `lines`. Equal weights when left out. */
  weights?: number[][];
}
export interface VelocityPressureReadings extends ReadingLayout {
  kind: "velocity_pressure";
  unit: PressureUnit;
}
export interface VelocityReadings extends ReadingLayout {
  kind: "velocity";
  unit: VelocityUnit;
}
export type Readings = VelocityPressureReadings | VelocityReadings;

export type InstrumentPrinciple = "differential_pressure" | "thermal" | "rotating_vane";
export interface Instrument {
  principle: InstrumentPrinciple;
  assumedDensity?: QuantityOf<"density">;
  accuracy?: { percentOfReading?: number; absolute?: QuantityOf<"pressure"> | QuantityOf<"velocity"> };
  /** The reading counts as gain × reading + offset, the offset in the unit of the readings. */
  calibration?: { gain?: number; offset?: number };
}

/** What becomes of a velocity pressure (or velocity) below zero. */
export type NegativeReadings = "count_as_zero" | "reject";

export interface Probe {
  coefficient?: number;
  diameter?: QuantityOf<"length">;
  length?: QuantityOf<"length">;
}

export interface Site {
  /** Straight length from the last disturbance upstream to the plane. */
  downstream?: QuantityOf<"length">;
  /** Straight length from the plane to the next disturbance. */
  upstream?: QuantityOf<"length">;
}

export interface Design {
  airflow: QuantityOf<"airflow">;
  basis?: "actual" | "standard";
  tolerancePercent?: number;
}

/** Standard uncertainties and half-widths that the caller knows better than the defaults. */
export interface UncertaintyOptions {
  /** Half-width of each measured dimension. */
  dimension?: QuantityOf<"length">;
  /** Relative standard uncertainty of the density, in percent. */
  densityPercent?: number;
  /** Relative standard uncertainty of layout and count, in percent. */
  layoutPercent?: number;
  /** Relative standard uncertainty of the site, in percent. */
  sitePercent?: number;
  /** Relative standard deviation of a single reading's fluctuation, in percent. */
  fluctuationPercent?: number;
  /** Resolution of the readings, in their unit; the digits they were written with when left out. */
  resolution?: number;
}

export type LayoutRule = "log_tchebycheff" | "log_linear" | "equal_area" | "method_1" | "custom";

/** Options that every calculation takes. */
export interface AnswerOptions {
  units?: UnitSystem;
  working?: boolean;
}
