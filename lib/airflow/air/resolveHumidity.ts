import { AirflowInputError, type Path } from "../errors";
import type { AirState } from "../types";
import { toSi } from "../units/convert";
import { humidityRatioFromDewPoint, humidityRatioFromRelativeHumidity, humidityRatioFromWetBulb, saturationHumidityRatio, saturationPressure } from "./humidAir";

const FORMS = ["relativeHumidity", "wetBulb", "dewPoint", "humidityRatio"] as const;
type Form = (typeof FORMS)[number];

const LOWEST_TEMPERATURE = 173.15;
/** What psychrolib answers for less than nothing. */
const NO_HUMIDITY = 1e-7;
const ROUNDING = 1e-9;

/**
 * Humidity ratio in kg/kg from whichever form of humidity is given; dry where none is.
 * @param air The state that was described.
 * @param dryBulb In K.
 * @param pressure Absolute, in Pa.
 * @param path Where the air stands in the caller's input.
 * @returns Humidity ratio in kg/kg, and whether dry air was assumed.
 * @throws {AirflowInputError} Two forms, or more water than the air can hold.
 * @example resolveHumidity({ dryBulb: { value: 20, unit: "degC" } }, 293.15, 101325, ["air"]) // { ratio: 0, assumedDry: true }
 */
export function resolveHumidity(air: AirState, dryBulb: number, pressure: number, path: Path): { ratio: number; assumedDry: boolean } {
  const [form, second] = FORMS.filter((one) => air[one] !== undefined);
  if (second) throw new AirflowInputError({ path: [...path, second], code: "two_humidities", detail: `Give one form of humidity; ${form} and ${second} were both given.` });
  if (!form) return { ratio: 0, assumedDry: true };
  const refuse = (code: string, detail: string): AirflowInputError => new AirflowInputError({ path: [...path, form], code, detail });
  return { ratio: FROM[form](air, dryBulb, pressure, refuse), assumedDry: false };
}

type Refuse = (code: string, detail: string) => AirflowInputError;

const FROM: Record<Form, (air: AirState, dryBulb: number, pressure: number, refuse: Refuse) => number> = {
  relativeHumidity(air, dryBulb, pressure, refuse) {
    const humidity = toSi("ratio", air.relativeHumidity!);
    if (!(humidity >= 0 && humidity <= 1)) throw refuse("humidity_out_of_range", "Relative humidity is 0 to 100 percent.");
    if (humidity * saturationPressure(dryBulb) >= pressure) throw refuse("vapour_exceeds_pressure", "At this dry bulb and pressure the vapour alone would exceed the absolute pressure.");
    return humidityRatioFromRelativeHumidity(dryBulb, humidity, pressure);
  },
  wetBulb(air, dryBulb, pressure, refuse) {
    const wetBulb = toSi("temperature", air.wetBulb!);
    if (wetBulb > dryBulb) throw refuse("wet_bulb_above_dry_bulb", "The wet bulb cannot be above the dry bulb. Were the two exchanged?");
    if (!(wetBulb >= LOWEST_TEMPERATURE)) throw refuse("temperature_out_of_range", "The wet bulb is below −100 °C. Check the unit.");
    if (saturationPressure(wetBulb) >= pressure) throw refuse("vapour_exceeds_pressure", "Water boils at this wet bulb and pressure.");
    const ratio = humidityRatioFromWetBulb(dryBulb, wetBulb, pressure);
    if (ratio <= NO_HUMIDITY) throw refuse("wet_bulb_too_low", "Even perfectly dry air would have a higher wet bulb at this dry bulb. Check both readings.");
    return ratio;
  },
  dewPoint(air, dryBulb, pressure, refuse) {
    const dewPoint = toSi("temperature", air.dewPoint!);
    if (dewPoint > dryBulb) throw refuse("dew_point_above_dry_bulb", "The dew point cannot be above the dry bulb. Were the two exchanged?");
    if (!(dewPoint >= LOWEST_TEMPERATURE)) throw refuse("temperature_out_of_range", "The dew point is below −100 °C. Check the unit.");
    if (saturationPressure(dewPoint) >= pressure) throw refuse("vapour_exceeds_pressure", "Water boils at this dew point and pressure.");
    return humidityRatioFromDewPoint(dewPoint, pressure);
  },
  humidityRatio(air, dryBulb, pressure, refuse) {
    const ratio = air.humidityRatio!;
    if (!(ratio >= 0 && ratio <= 1)) throw refuse("humidity_out_of_range", "The humidity ratio is mass of vapour per mass of dry air, 0 to 1.");
    const canSaturate = saturationPressure(dryBulb) < pressure;
    if (canSaturate && ratio > saturationHumidityRatio(dryBulb, pressure) * (1 + ROUNDING)) throw refuse("humidity_over_saturation", "The air cannot hold this much water at this dry bulb and pressure: the relative humidity would be over 100 percent.");
    return ratio;
  },
};
