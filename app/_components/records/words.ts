import type { Air, Duct } from "@/lib/airflow/types";
import { formatQuantity } from "../format/number";

/** A duct in words: "rectangular, 26 in × 18 in outside, lining 1 in". */
export function ductWords(duct: Duct): string {
  const size =
    duct.shape === "rectangular" ? `${formatQuantity(duct.width)} × ${formatQuantity(duct.height)}`
    : duct.shape === "round" ? `${formatQuantity(duct.diameter)} across`
    : `${formatQuantity(duct.major)} × ${formatQuantity(duct.minor)}`;
  const walls = [duct.wall?.thickness && `wall ${formatQuantity(duct.wall.thickness)}`, duct.wall?.lining && `lining ${formatQuantity(duct.wall.lining)}`].filter(Boolean);
  return [`${duct.shape.replace("_", " ")}, ${size} ${duct.measured}`, ...walls].join(", ");
}

/** The air in words, as it was measured. */
export function airWords(air: Air | undefined): string {
  if (!air) return "standard air assumed";
  if ("density" in air) return `density ${formatQuantity(air.density)}`;
  const humidity =
    air.relativeHumidity ? `${formatQuantity(air.relativeHumidity)} relative humidity`
    : air.wetBulb ? `wet bulb ${formatQuantity(air.wetBulb)}`
    : air.dewPoint ? `dew point ${formatQuantity(air.dewPoint)}`
    : air.humidityRatio !== undefined ? `humidity ratio ${air.humidityRatio}`
    : "dry";
  return [
    `dry bulb ${formatQuantity(air.dryBulb)}`, humidity,
    air.altitude && `altitude ${formatQuantity(air.altitude)}`, air.barometricPressure && `barometric ${formatQuantity(air.barometricPressure)}`,
    air.ductStaticPressure && `duct static ${formatQuantity(air.ductStaticPressure)}`,
  ].filter(Boolean).join(", ");
}
