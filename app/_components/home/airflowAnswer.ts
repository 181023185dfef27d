import type { Check } from "@/lib/airflow/checks/check";
import type { Quantity } from "@/lib/airflow/units/units";
import type { WorkingStep } from "@/lib/airflow/working/working";
import type { Verdict } from "../figures/VerdictBand";

/** What the sheet shows of the operation's answer. */
export interface AirflowAnswer {
  airflow: { actual: Quantity; standard: Quantity; mass: Quantity };
  averageVelocity: Quantity;
  area: Quantity;
  air: { density: Quantity };
  points: { line: number; point: number; velocity: Quantity | null }[];
  checks: Check[];
  uncertainty?: { expanded: Quantity };
  design?: { percentOfDesign: number; verdict: Verdict };
  working: WorkingStep[];
}
