import { ductArea } from "@/lib/airflow/calculations/ductArea";
import { LAYOUT_WORDS } from "@/lib/airflow/figure/words";
import type { Assumption } from "@/lib/airflow/air/resolveAir";
import type { AirState, Duct, InstrumentPrinciple, Site, StandardAirName } from "@/lib/airflow/types";
import type { QuantityOf } from "@/lib/airflow/units/units";
import type { Context } from "../options";
import { asGiven, digits, quantity, size, unitSymbol } from "../quantities";
import type { Fact } from "../table";

const SHAPES: Record<Duct["shape"], string> = { rectangular: "Rectangular", round: "Round", flat_oval: "Flat oval" };

/** A duct's or a result's dimensions in the order in which they are spoken. */
function lengthsOf(duct: { shape: Duct["shape"] } & Partial<Record<"width" | "height" | "diameter" | "major" | "minor", QuantityOf<"length">>>): QuantityOf<"length">[] {
  return [duct.width, duct.height, duct.diameter, duct.major, duct.minor].filter((length) => length !== undefined);
}

export function ductFacts({ document, system }: Context): Fact[] {
  const { holes, measurement: { duct, layout, site } } = document;
  const { inside, hydraulicDiameter } = ductArea({ duct, units: system });
  const { thickness, lining } = duct.wall ?? {};
  const wall = [thickness && `${asGiven(thickness)} wall`, lining && `${asGiven(lining)} lining`].filter(Boolean).join(", ");
  return [
    ["Measured", `${SHAPES[duct.shape]}, ${lengthsOf(duct).map(asGiven).join(" × ")} ${duct.measured}`],
    ["Wall", wall || "none given"],
    ["Inside", size(lengthsOf(inside), system)],
    ["Area", quantity(document.result.area, 5)],
    ["Hydraulic dia.", size([hydraulicDiameter], system)],
    ["Layout", layout ? LAYOUT_WORDS[layout] : "not named"],
    ["Straight run", straightRun(site) || "not given"],
    ["Holes", `${holes.count}, ${holes.sealed ? `sealed${holes.method ? `: ${holes.method}` : ""}` : "not sealed"}`],
  ];
}

const straightRun = (site: Site | undefined): string => [site?.downstream && `${asGiven(site.downstream)} before`, site?.upstream && `${asGiven(site.upstream)} after`].filter(Boolean).join(", ");

const ASSUMED: Record<Assumption, string> = { standard_air: "standard air", dry_air: "dry air", sea_level: "sea level" };
const STANDARD_AIRS: Record<StandardAirName, string> = { ashrae: "ASHRAE", iso: "ISO", epa: "EPA", normal: "normal conditions" };

function humidity({ relativeHumidity, wetBulb, dewPoint, humidityRatio }: AirState): Fact[] {
  if (relativeHumidity) return [["Rel. humidity", asGiven(relativeHumidity)]];
  if (wetBulb) return [["Wet bulb", asGiven(wetBulb)]];
  if (dewPoint) return [["Dew point", asGiven(dewPoint)]];
  return humidityRatio === undefined ? [] : [["Humidity ratio", String(humidityRatio)]];
}

export function airFacts({ document }: Context): Fact[] {
  const { air } = document.measurement;
  const { density, densityRatio, standardAir, absolutePressure, assumed } = document.result.air;
  const state = air && "dryBulb" in air ? air : null;
  return [
    ...(state ? [["Dry bulb", asGiven(state.dryBulb)] as const, ...humidity(state)] : []),
    ...(state?.altitude ? [["Altitude", asGiven(state.altitude)] as const] : []),
    ...(state?.barometricPressure ? [["Barometer", asGiven(state.barometricPressure)] as const] : []),
    ...(state?.ductStaticPressure ? [["Duct static", asGiven(state.ductStaticPressure)] as const] : []),
    ...(absolutePressure ? [["Absolute", quantity(absolutePressure)] as const] : []),
    ["Density", `${quantity(density)}${air && "density" in air ? ", given" : ""}`],
    ["Of standard air", `${digits(densityRatio, 4)} of ${quantity(standardAir.density)} (${STANDARD_AIRS[standardAir.name]})`],
    ...(assumed.length > 0 ? [["Assumed", assumed.map((one) => ASSUMED[one]).join(", ")] as const] : []),
  ];
}

const PRINCIPLES: Record<InstrumentPrinciple, string> = { differential_pressure: "differential pressure", thermal: "thermal", rotating_vane: "rotating vane" };

export function instrumentFacts({ document }: Context): Fact[] {
  const { instrument, calibrationWaiver, measurement } = document;
  const { instrument: read, probe } = measurement;
  const calibration = instrument?.calibration;
  const accuracy = [read?.accuracy?.percentOfReading !== undefined && `${read.accuracy.percentOfReading} % of reading`, read?.accuracy?.absolute && asGiven(read.accuracy.absolute)].filter(Boolean).join(" and ");
  const { gain = 1, offset = 0 } = read?.calibration ?? {};
  return [
    ["Name", instrument ? instrument.name : "not named"],
    ...(instrument?.manufacturer || instrument?.model ? [["Make, model", [instrument.manufacturer, instrument.model].filter(Boolean).join(", ")] as const] : []),
    ...(instrument?.serialNumber ? [["Serial number", instrument.serialNumber] as const] : []),
    ...(read ? [["Principle", PRINCIPLES[read.principle]] as const] : []),
    ...(probe?.coefficient !== undefined || probe?.diameter ? [["Probe", [probe.coefficient !== undefined && `coefficient ${probe.coefficient}`, probe.diameter && `${asGiven(probe.diameter)} diameter`].filter(Boolean).join(", ")] as const] : []),
    ...(accuracy ? [["Accuracy", `± ${accuracy}`] as const] : []),
    ...(calibration
      ? ([["Calibrated", `${calibration.calibratedOn}, due ${calibration.dueOn}`], ["Laboratory", [calibration.laboratory, calibration.certificateNumber].filter(Boolean).join(", ") || "not given"]] as const)
      : ([["Calibrated", "no calibration in force"]] as const)),
    ...(gain !== 1 || offset !== 0 ? [["Correction", `${gain} × reading${offset === 0 ? "" : ` ${offset < 0 ? "−" : "+"} ${Math.abs(offset)} ${unitSymbol(measurement.readings.unit)}`}`] as const] : []),
    ...(calibrationWaiver ? [["Waiver", calibrationWaiver.reason] as const] : []),
  ];
}
