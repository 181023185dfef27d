import { z } from "zod";
import { UNITS, type QuantityKind, type UnitOf } from "@/lib/airflow/units/units";

const unitNames = <Kind extends QuantityKind>(kind: Kind): [UnitOf<Kind>, ...UnitOf<Kind>[]] => Object.keys(UNITS[kind]) as [UnitOf<Kind>, ...UnitOf<Kind>[]];

/** The table of a quantity's units, for the reference. */
const unitTable = (kind: QuantityKind): string =>
  Object.entries(UNITS[kind]).map(([name, { ucum, name: words }]) => `\`${name}\` ${words} (UCUM \`${ucum}\`)`).join(", ");

const quantity = <Kind extends QuantityKind, Id extends string>(kind: Kind, id: Id, words: string) =>
  z
    .strictObject({
      value: z.number().describe("The number, not rounded."),
      unit: z.enum(unitNames(kind)).describe("Its unit."),
    })
    .meta({ id, description: `${words}: ${unitTable(kind)}.` });

export const length = quantity("length", "Length", "A length");
export const area = quantity("area", "Area", "An area");
export const velocity = quantity("velocity", "Velocity", "A velocity");
export const pressure = quantity("pressure", "Pressure", "A pressure");
export const temperature = quantity("temperature", "Temperature", "A temperature");
export const density = quantity("density", "Density", "A density");
export const specificVolume = quantity("specificVolume", "SpecificVolume", "A volume for each unit of mass");
export const airflow = quantity("airflow", "Airflow", "A volume flow");
export const massFlow = quantity("massFlow", "MassFlow", "A mass flow");
export const speed = quantity("speed", "Speed", "A speed of rotation");
export const power = quantity("power", "Power", "A power");
export const ratio = quantity("ratio", "Ratio", "A ratio");

export const pressureUnit = z.enum(unitNames("pressure"));
export const velocityUnit = z.enum(unitNames("velocity"));

/** A velocity or an airflow, told apart by the unit. */
export const velocityOrAirflow = z
  .strictObject({ value: z.number().describe("The number, not rounded."), unit: z.enum([...unitNames("velocity"), ...unitNames("airflow")]).describe("A unit of velocity or of airflow.") })
  .meta({ id: "VelocityOrAirflow", description: "A velocity or a volume flow, as its unit says." });
