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
export interface VelocityPressureReadings {
  kind: "velocity_pressure";
  unit: PressureUnit;
  lines: ReadingLines;
}
export interface VelocityReadings {
  kind: "velocity";
  unit: VelocityUnit;
  lines: ReadingLines;
}
export type Readings = VelocityPressureReadings | VelocityReadings;

export type InstrumentPrinciple = "differential_pressure" | "thermal" | "rotating_vane";
export interface Instrument {
  principle: InstrumentPrinciple;
  assumedDensity?: QuantityOf<"density">;
  accuracy?: { percentOfReading?: number; absolute?: QuantityOf<"pressure"> | QuantityOf<"velocity"> };
  calibration?: { gain?: number; offset?: number };
}

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

export type LayoutRule = "log_tchebycheff" | "log_linear" | "equal_area" | "method_1" | "custom";

/** Options that every calculation takes. */
export interface AnswerOptions {
  units?: UnitSystem;
  working?: boolean;
}
