import { UNITS, type PressureUnit } from "../../units/units";
import type { Case } from "../case";

/**
 * Constants that velocity is worked out with by hand, in place of √2 and unit factors. They are rounded, and those in
 * inches of water stand for water of about 68 °F, so they differ from the exact equation by up to 0.1 %.
 * @see V = 1096.7 √(p_v / ρ) and V = 4005 √p_v for 0.075 lb/ft³, in ft/min and in wg: common practice. √(2 / 1.2) = 1.291.
 */
interface TradeConstant {
  value: number;
  /** Unit of the pressure that it is for. */
  unit: PressureUnit;
  /** Whether it holds standard air, 0.075 lb/ft³ or 1.2 kg/m³, within it. */
  forStandardAir: boolean;
  /** The factor k of V = k √p in m/s and Pa, for a density in kg/m³. */
  factor: (density: number) => number;
}

const FEET_PER_MINUTE = UNITS.velocity["ft/min"].factor;
const ROOT_INCH_OF_WATER = Math.sqrt(UNITS.pressure.in_wg.factor);
const POUND_PER_CUBIC_FOOT = UNITS.density["lb/ft3"].factor;

const TRADE_CONSTANTS: readonly TradeConstant[] = [
  { value: 4005, unit: "in_wg", forStandardAir: true, factor: () => (4005 * FEET_PER_MINUTE) / ROOT_INCH_OF_WATER },
  { value: 1096.7, unit: "in_wg", forStandardAir: false, factor: (density) => ((1096.7 * FEET_PER_MINUTE) / ROOT_INCH_OF_WATER) * Math.sqrt(POUND_PER_CUBIC_FOOT / density) },
  { value: 1.291, unit: "Pa", forStandardAir: true, factor: () => 1.291 },
  { value: 1.29, unit: "Pa", forStandardAir: true, factor: () => 1.29 },
];

/** The constants that readings in their unit may have been worked out with. */
export const constantsFor = ({ readings }: Case): readonly TradeConstant[] => TRADE_CONSTANTS.filter(({ unit }) => unit === readings.unit);

/** What a trade constant does to a velocity, against the exact equation at a density in kg/m³. */
export const constantFactor = (constant: TradeConstant, density: number): number => constant.factor(density) / Math.sqrt(2 / density);
