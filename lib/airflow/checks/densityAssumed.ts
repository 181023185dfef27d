import type { Assumption } from "../air/resolveAir";
import { humidAirDensity, saturationHumidityRatio } from "../air/humidAir";
import { standardAtmospherePressure } from "../air/standardAtmosphere";
import { densityExponent } from "../velocity/densityExponent";
import type { CheckFunction } from "./context";

const WORDS: Record<Assumption, string> = {
  standard_air: "no air was described, so standard air",
  dry_air: "no humidity was given, so dry air",
  sea_level: "neither altitude nor barometric pressure was given, so sea level",
};

const EIGHTY_FAHRENHEIT = 299.82;
const FIVE_THOUSAND_FEET = 1524;

/** Density as it may really be, over the density assumed: at 5,000 ft, and saturated at 80 °F. */
const ALTITUDE_RATIO = standardAtmospherePressure(FIVE_THOUSAND_FEET) / standardAtmospherePressure(0);
const HUMID_RATIO =
  humidAirDensity(EIGHTY_FAHRENHEIT, saturationHumidityRatio(EIGHTY_FAHRENHEIT, standardAtmospherePressure(0)), standardAtmospherePressure(0)) /
  humidAirDensity(EIGHTY_FAHRENHEIT, 0, standardAtmospherePressure(0));
const DENSITY_RATIO: Record<Assumption, number> = { standard_air: ALTITUDE_RATIO, dry_air: HUMID_RATIO, sea_level: ALTITUDE_RATIO };

/** What was taken for granted about the air, and how far the figure could move for it. */
export const densityAssumed: CheckFunction = ({ air: { assumed }, readings, instrument }) => {
  const untold = readings.kind === "velocity" && !instrument;
  const exponent = densityExponent(readings, instrument);
  // Where the velocity does not depend on density, the mass still does.
  const [moves, power] = exponent === 0 ? ["standard and mass airflow", 1] : ["average velocity", exponent];
  const couldMove = Math.max(0, ...assumed.map((one) => 100 * Math.abs(DENSITY_RATIO[one] ** power - 1)));
  const passed = assumed.length === 0 && !untold;
  const reasons = [...assumed.map((one) => `${WORDS[one]} was assumed`), ...(untold ? ["the instrument's principle was not given, so its velocities were taken as actual"] : [])];
  return {
    code: "density_assumed",
    passed,
    severity: "caution",
    detail: passed
      ? "The density follows from what was measured."
      : `${reasons.join("; ").replace(/^./, (first) => first.toUpperCase())}. At 5,000 ft, or in saturated air, the ${moves} would move by up to ${couldMove.toPrecision(2)} percent. Give the air's temperature, humidity and altitude.`,
    compared: { quantity: `possible shift of the ${moves}`, value: couldMove, limit: 0, unit: "percent" },
    source: "US Standard Atmosphere 1976 and humid-air equations, at 5,000 ft and at 80 °F",
  };
};
