/**
 * Every unit a caller may use, with its exact factor to the SI unit the engine computes in.
 *
 * Factors are exact by definition (international foot and pound, conventional water and mercury, standard gravity).
 * @see NIST SP 811 (2008), Appendix B. Checked against an independent unit library in tests/reference/units.test.ts.
 */
const INCH = 0.0254;
const FOOT = 12 * INCH;
const POUND = 0.45359237;
const STANDARD_GRAVITY = 9.80665;
const MINUTE = 60;

/** Conventional inch of water: a column of exactly 1000 kg/m³ under standard gravity, 249.08891 Pa. */
const INCH_OF_WATER = 1000 * STANDARD_GRAVITY * INCH;
/** Conventional inch of mercury: a column of exactly 13 595.1 kg/m³ under standard gravity, 3386.388 640 341 Pa. */
const INCH_OF_MERCURY = 13595.1 * STANDARD_GRAVITY * INCH;
const POUND_PER_SQUARE_INCH = (POUND * STANDARD_GRAVITY) / INCH ** 2;
/** Mechanical horsepower: 550 foot pounds-force a second. */
const HORSEPOWER = 550 * FOOT * POUND * STANDARD_GRAVITY;

export interface UnitDefinition {
  /** SI value = value × factor + offset. */
  factor: number;
  offset: number;
  /** Unified Code for Units of Measure, case-sensitive. */
  ucum: string;
  name: string;
}

const unit = (factor: number, ucum: string, name: string, offset = 0): UnitDefinition => ({ factor, offset, ucum, name });

/** Units by quantity. The SI unit of each quantity is the one with factor 1 and offset 0. */
export const UNITS = {
  length: {
    in: unit(INCH, "[in_i]", "inch"),
    ft: unit(FOOT, "[ft_i]", "foot"),
    mm: unit(0.001, "mm", "millimetre"),
    cm: unit(0.01, "cm", "centimetre"),
    m: unit(1, "m", "metre"),
  },
  area: {
    in2: unit(INCH ** 2, "[sin_i]", "square inch"),
    ft2: unit(FOOT ** 2, "[sft_i]", "square foot"),
    m2: unit(1, "m2", "square metre"),
  },
  velocity: {
    "ft/min": unit(FOOT / MINUTE, "[ft_i]/min", "foot per minute"),
    "m/s": unit(1, "m/s", "metre per second"),
  },
  pressure: {
    in_wg: unit(INCH_OF_WATER, "[in_i'H2O]", "inch of water gauge (conventional)"),
    Pa: unit(1, "Pa", "pascal"),
    hPa: unit(100, "hPa", "hectopascal"),
    kPa: unit(1000, "kPa", "kilopascal"),
    inHg: unit(INCH_OF_MERCURY, "[in_i'Hg]", "inch of mercury (conventional)"),
    mbar: unit(100, "mbar", "millibar"),
    psi: unit(POUND_PER_SQUARE_INCH, "[psi]", "pound-force per square inch"),
  },
  temperature: {
    degF: unit(5 / 9, "[degF]", "degree Fahrenheit", (459.67 * 5) / 9),
    degC: unit(1, "Cel", "degree Celsius", 273.15),
    K: unit(1, "K", "kelvin"),
  },
  density: {
    "lb/ft3": unit(POUND / FOOT ** 3, "[lb_av]/[cft_i]", "pound per cubic foot"),
    "kg/m3": unit(1, "kg/m3", "kilogram per cubic metre"),
  },
  specificVolume: {
    "ft3/lb": unit(FOOT ** 3 / POUND, "[cft_i]/[lb_av]", "cubic foot per pound"),
    "m3/kg": unit(1, "m3/kg", "cubic metre per kilogram"),
  },
  airflow: {
    "ft3/min": unit(FOOT ** 3 / MINUTE, "[cft_i]/min", "cubic foot per minute"),
    "L/s": unit(0.001, "L/s", "litre per second"),
    "m3/s": unit(1, "m3/s", "cubic metre per second"),
    "m3/h": unit(1 / 3600, "m3/h", "cubic metre per hour"),
  },
  massFlow: {
    "lb/min": unit(POUND / MINUTE, "[lb_av]/min", "pound per minute"),
    "kg/s": unit(1, "kg/s", "kilogram per second"),
  },
  speed: { rpm: unit(1 / MINUTE, "{rev}/min", "revolution per minute") },
  power: {
    hp: unit(HORSEPOWER, "[HP]", "mechanical horsepower"),
    kW: unit(1000, "kW", "kilowatt"),
  },
  ratio: { percent: unit(0.01, "%", "percent") },
} as const satisfies Record<string, Record<string, UnitDefinition>>;

export type QuantityKind = keyof typeof UNITS;
export type UnitOf<Kind extends QuantityKind> = keyof (typeof UNITS)[Kind] & string;

export type LengthUnit = UnitOf<"length">;
export type AreaUnit = UnitOf<"area">;
export type VelocityUnit = UnitOf<"velocity">;
export type PressureUnit = UnitOf<"pressure">;
export type TemperatureUnit = UnitOf<"temperature">;
export type DensityUnit = UnitOf<"density">;
export type AirflowUnit = UnitOf<"airflow">;
export type MassFlowUnit = UnitOf<"massFlow">;
export type SpecificVolumeUnit = UnitOf<"specificVolume">;

/** A number with its unit, as it stands in every request and answer. */
export interface Quantity<U extends string = string> {
  value: number;
  unit: U;
}
export type QuantityOf<Kind extends QuantityKind> = Quantity<UnitOf<Kind>>;

/** The system of units an answer is given in. */
export type UnitSystem = "ip" | "si";

/** The unit of each quantity in an answer. Absolute pressures are answered in inHg or kPa, as barometers read. */
export const ANSWER_UNITS = {
  ip: {
    length: "in", area: "ft2", velocity: "ft/min", pressure: "in_wg", absolutePressure: "inHg", temperature: "degF",
    density: "lb/ft3", specificVolume: "ft3/lb", airflow: "ft3/min", massFlow: "lb/min", speed: "rpm", power: "hp",
  },
  si: {
    length: "mm", area: "m2", velocity: "m/s", pressure: "Pa", absolutePressure: "kPa", temperature: "degC",
    density: "kg/m3", specificVolume: "m3/kg", airflow: "L/s", massFlow: "kg/s", speed: "rpm", power: "kW",
  },
} as const;
