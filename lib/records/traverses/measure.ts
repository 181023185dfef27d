import { airflow, type AirflowAnswer } from "@/lib/airflow/calculations/airflow";
import { ductArea } from "@/lib/airflow/calculations/ductArea";
import { AirflowInputError } from "@/lib/airflow/errors";
import { planTraverse } from "@/lib/airflow/layout/plan";
import type { Instrument, Readings } from "@/lib/airflow/types";
import { fromSi, toSi } from "@/lib/airflow/units/convert";
import { UNITS, type QuantityOf } from "@/lib/airflow/units/units";
import { ENGINE_VERSION } from "@/lib/airflow/version";
import type { Measurement } from "../issuedDocument";
import type { DatedInstrument } from "./datedInstrument";
import type { TraverseInput } from "./row";

/** What a draft's figures come to, as its row keeps them; all null while there is nothing to calculate. */
export interface Measured {
  result: AirflowAnswer | null;
  engine_version: string | null;
  percent_of_design: number | null;
  outside_tolerance: boolean | null;
}

const NOTHING: Measured = { result: null, engine_version: null, percent_of_design: null, outside_tolerance: null };

/** What the engine is given: what was measured, and the instrument as it was on the day. Null while there is no duct or no reading. */
export function measurementOf(input: TraverseInput, instrument: DatedInstrument | null): Measurement | null {
  const { location: _l, technician: _t, notes: _n, holes: _h, calibrationWaiver: _w, duct, readings, probe, ...rest } = input;
  if (!duct || !readings || !readings.lines.flat().some((reading) => reading !== null)) return null;
  const itsProbe = probe ?? instrument?.properties.probe;
  return { duct, readings, ...rest, ...(itsProbe && { probe: itsProbe }), ...(instrument && { instrument: asRead(instrument, readings) }) } as Measurement;
}

/**
 * The result of what was measured, with its working, in the form that the row keeps.
 * @throws {AirflowInputError} What was measured cannot be.
 */
export function measure(input: TraverseInput, instrument: DatedInstrument | null): Measured {
  const measurement = measurementOf(input, instrument);
  if (measurement === null) {
    requirePlan(input);
    return NOTHING;
  }
  const { points: _points, enterFrom: _enterFrom, ...calculated } = measurement;
  const result = airflow({ ...calculated, working: true });
  const design = result.design;
  return {
    result,
    engine_version: ENGINE_VERSION,
    percent_of_design: design?.percent ?? null,
    outside_tolerance: design ? Math.abs(design.percent - 100) > design.tolerancePercent : null,
  };
}

/** So that a duct or a plan that cannot be is told of at once, and not when the last reading comes in. */
function requirePlan({ duct, layout, points, enterFrom, probe, site }: TraverseInput): void {
  if (!duct) return;
  if (layout) planTraverse({ duct, layout, points, enterFrom, probe, site });
  else ductArea({ duct });
}

/** An instrument as the calculation takes it: its calibration's offset in the unit of the readings. */
function asRead({ properties: { probe: _probe, ...properties }, calibration, gain, offset }: DatedInstrument, readings: Readings): Instrument {
  // A calibration that found nothing to correct adds nothing to the working either.
  if (!calibration || (gain === 1 && !offset)) return properties;
  return { ...properties, calibration: { gain, ...(offset && { offset: inUnitOf(readings, offset) }) } };
}

function inUnitOf({ kind, unit }: Readings, offset: NonNullable<DatedInstrument["offset"]>): number {
  if (kind === "velocity" && offset.unit in UNITS.velocity) return fromSi("velocity", toSi("velocity", offset as QuantityOf<"velocity">), unit).value;
  if (kind === "velocity_pressure" && offset.unit in UNITS.pressure) return fromSi("pressure", toSi("pressure", offset as QuantityOf<"pressure">), unit).value;
  throw new AirflowInputError({ path: ["instrumentId"], code: "calibration_unit_differs", detail: `The instrument's calibration has an offset in ${offset.unit}, which does not go with readings in ${unit}.` });
}
