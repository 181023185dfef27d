import type { AirflowAnswer } from "@/lib/airflow/calculations/airflow";
import { dayOf } from "../instruments";
import type { DatedInstrument } from "./datedInstrument";
import type { TraverseInput } from "./row";

export interface Missing {
  pointer: string;
  code: string;
  detail: string;
}

interface Candidate {
  input: TraverseInput;
  takenAt: Date | null;
  instrument: DatedInstrument | null;
  result: AirflowAnswer | null;
}

/** Everything that a draft still needs before it can be issued; nothing where it is ready. */
export function missingForIssue({ input, takenAt, instrument, result }: Candidate): Missing[] {
  const missing: Missing[] = [];
  const add = (pointer: string, code: string, detail: string): number => missing.push({ pointer, code, detail });
  if (!result) add(input.duct ? "/readings" : "/duct", "no_result", `There is no result: ${input.duct ? "no point was read" : "the duct is not described"}.`);
  if (!input.technician) add("/technician", "no_technician", "Who took the traverse is not said.");
  if (!takenAt) add("/takenAt", "not_dated", "When the traverse was taken is not said.");
  if (takenAt && takenAt.getTime() > Date.now()) add("/takenAt", "taken_in_future", "The traverse is dated in the future.");
  if (!input.holes) add("/holes", "holes_unknown", "How many holes were drilled, and whether they were sealed, is not said.");
  else if (!input.holes.sealed) add("/holes/sealed", "holes_not_sealed", "The holes were not all sealed.");
  const fault = input.calibrationWaiver ? null : calibrationFault(instrument, takenAt);
  if (fault) add("/instrumentId", fault.code, `${fault.detail} Name another instrument, add its calibration, or give a calibrationWaiver with a reason.`);
  return missing;
}

function calibrationFault(instrument: DatedInstrument | null, takenAt: Date | null): { code: string; detail: string } | null {
  if (!instrument) return { code: "no_instrument", detail: "The instrument is not named." };
  if (!instrument.calibration) return { code: "not_calibrated", detail: `${instrument.name} had no calibration on the day.` };
  const day = dayOf(takenAt ?? new Date());
  if (day > instrument.calibration.dueOn) return { code: "calibration_out_of_date", detail: `The calibration of ${instrument.name} was due on ${instrument.calibration.dueOn}, before the traverse was taken.` };
  return null;
}
