import { resolveAir } from "../air/resolveAir";
import { AirflowInputError, type InputFault, type Path } from "../errors";
import { atRatios, fanRatios, type FanPoint, type FanRatios } from "../fan/fanLaws";
import { fanWarnings, type FanWarning } from "../fan/fanWarnings";
import type { Air, AnswerOptions, StandardAirName } from "../types";
import { inAnswerUnits, toSi } from "../units/convert";
import type { QuantityOf } from "../units/units";
import type { WorkingStep } from "../working/working";
import { ratio } from "./airAnswer";
import { resolveOptions, workingPart, type ResolvedOptions } from "./options";

export interface FanAdjustmentInput extends AnswerOptions {
  fan: {
    speed: QuantityOf<"speed">;
    /** Greatest speed of the fan's class. */
    maximumSpeed?: QuantityOf<"speed">;
    /** Of the motor's nameplate. */
    motorPower?: QuantityOf<"power">;
  };
  measured: {
    airflow: QuantityOf<"airflow">;
    staticPressure?: QuantityOf<"pressure">;
    /** Power that the fan takes at its shaft. */
    power?: QuantityOf<"power">;
    /** Standard air when left out. */
    air?: Air;
  };
  design: {
    airflow: QuantityOf<"airflow">;
    /** As measured when left out. */
    air?: Air;
  };
  standardAir?: StandardAirName;
}

export interface FanAdjustmentAnswer {
  /** At the design airflow. */
  fan: {
    speed: QuantityOf<"speed">;
    airflow: QuantityOf<"airflow">;
    staticPressure: QuantityOf<"pressure"> | null;
    power: QuantityOf<"power"> | null;
    density: QuantityOf<"density">;
    /** Power over the motor's nameplate; null where either is not known. */
    motorLoad: QuantityOf<"ratio"> | null;
  };
  /** New over measured. */
  ratios: FanRatios;
  warnings: FanWarning[];
  working?: WorkingStep[];
}

/** No fan that moves air in a building is beyond these; a larger figure is a slip in the unit. SI. */
const GREATEST = { speed: 1_000, airflow: 10_000, power: 1e8, pressure: 100_000 } as const;

/**
 * The speed, static pressure and power of a fan at its design airflow, by the fan laws, with what to look at first.
 * @throws {AirflowInputError} A speed, airflow, pressure or power that is not above 0, or air that cannot be.
 */
export function fanAdjustment(input: FanAdjustmentInput): FanAdjustmentAnswer {
  const options = resolveOptions(input);
  const { fan, measured, design } = input;
  refuseImpossible(input);
  const density = resolveAir(measured.air, options.standardDensity, ["measured", "air"]).density;
  const designDensity = design.air ? resolveAir(design.air, options.standardDensity, ["design", "air"]).density : density;
  const now: FanPoint = {
    speed: toSi("speed", fan.speed),
    airflow: toSi("airflow", measured.airflow),
    staticPressure: measured.staticPressure ? toSi("pressure", measured.staticPressure) : null,
    power: measured.power ? toSi("power", measured.power) : null,
    density,
  };
  const motorPower = fan.motorPower ? toSi("power", fan.motorPower) : null;
  const ratios = fanRatios(toSi("airflow", design.airflow) / now.airflow, designDensity / density);
  const then = atRatios(now, ratios);
  addFanWorking(now, then, ratios, options);
  return {
    fan: {
      ...fanFigures(then, options),
      motorLoad: then.power === null || motorPower === null ? null : { value: (100 * then.power) / motorPower, unit: "percent" },
    },
    ratios,
    warnings: fanWarnings(then, ratios, { motorPower, maximumSpeed: fan.maximumSpeed ? toSi("speed", fan.maximumSpeed) : null }),
    ...workingPart(options.working),
  };
}

const fanFigures = ({ speed, airflow, staticPressure, power, density }: FanPoint, { system }: ResolvedOptions) => ({
  speed: inAnswerUnits("speed", speed, system),
  airflow: inAnswerUnits("airflow", airflow, system),
  staticPressure: staticPressure === null ? null : inAnswerUnits("pressure", staticPressure, system),
  power: power === null ? null : inAnswerUnits("power", power, system),
  density: inAnswerUnits("density", density, system),
});

function refuseImpossible({ fan, measured, design }: FanAdjustmentInput): void {
  const faults = [
    outOfRange("speed", ["fan", "speed"], fan.speed),
    outOfRange("speed", ["fan", "maximumSpeed"], fan.maximumSpeed),
    outOfRange("power", ["fan", "motorPower"], fan.motorPower),
    outOfRange("airflow", ["measured", "airflow"], measured.airflow),
    outOfRange("pressure", ["measured", "staticPressure"], measured.staticPressure),
    outOfRange("power", ["measured", "power"], measured.power),
    outOfRange("airflow", ["design", "airflow"], design.airflow),
  ].filter((fault) => fault !== null);
  const [first, ...rest] = faults;
  if (first) throw new AirflowInputError(first, ...rest);
}

function outOfRange<Kind extends keyof typeof GREATEST>(kind: Kind, path: Path, quantity: QuantityOf<Kind> | undefined): InputFault | null {
  if (!quantity) return null;
  const si = toSi(kind, quantity);
  if (si > 0 && si <= GREATEST[kind]) return null;
  return { path, code: "figure_out_of_range", detail: `${quantity.value} ${quantity.unit} is not above 0, or beyond any fan in a building. Check the value and its unit.` };
}

function addFanWorking(now: FanPoint, then: FanPoint, ratios: FanRatios, options: ResolvedOptions): void {
  const { working } = options;
  if (!working) return;
  const [before, after] = [fanFigures(now, options), fanFigures(then, options)];
  const source = "Fan laws, ASHRAE Handbook, HVAC Systems and Equipment, from memory";
  working.add({ step: "Ratio of airflow", equation: "r = Q₂ / Q₁", inputs: { "Q₁": before.airflow, "Q₂": after.airflow }, value: ratio(ratios.airflow), source: "Definition" });
  working.add({ step: "Ratio of density", equation: "d = ρ₂ / ρ₁", inputs: { "ρ₁": before.density, "ρ₂": after.density }, value: ratio(ratios.density), source: "Definition" });
  working.add({ step: "Speed", equation: "N₂ = N₁ r", inputs: { "N₁": before.speed, r: ratio(ratios.airflow) }, value: after.speed, source });
  if (before.staticPressure && after.staticPressure) {
    working.add({ step: "Static pressure", equation: "p₂ = p₁ d r²", inputs: { "p₁": before.staticPressure, d: ratio(ratios.density), r: ratio(ratios.airflow) }, value: after.staticPressure, source });
  }
  if (before.power && after.power) {
    working.add({ step: "Power", equation: "W₂ = W₁ d r³", inputs: { "W₁": before.power, d: ratio(ratios.density), r: ratio(ratios.airflow) }, value: after.power, source });
  }
}
