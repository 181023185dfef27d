import { airflow, type AirflowAnswer, type AirflowInput } from "@/lib/airflow/calculations/airflow";
import { AirflowInputError, type InputFault } from "@/lib/airflow/errors";
import { planFigure } from "@/lib/airflow/figure/planFigure";
import { resultFigure } from "@/lib/airflow/figure/resultFigure";
import { planTraverse } from "@/lib/airflow/layout/plan";
import { ductOf, requestOf, type BenchSheet } from "./benchSheet";

/** What the engine makes of a sheet, here in the browser. */
export interface BenchOutcome {
  request: AirflowInput | null;
  answer: AirflowAnswer | null;
  /** Points of each hole by the plan; null where there is no plan. */
  holes: number[] | null;
  /** The result's drawing, or while there is none the plan's; null where there is no duct. */
  figure: string | null;
  /** What cannot be, in the engine's words. */
  faults: readonly InputFault[];
}

export function calculate(sheet: BenchSheet, width: number): BenchOutcome {
  const duct = ductOf(sheet);
  if (!duct) return { request: null, answer: null, holes: null, figure: null, faults: [] };
  const plan = { duct, layout: sheet.layout, enterFrom: sheet.enterFrom };
  const planned = attempt(() => planTraverse(plan).lines.map(({ points }) => points.length));
  const request = requestOf(sheet);
  const answer = attempt(() => request && airflow(request));
  const figure = attempt(() =>
    request && answer.value ? resultFigure({ ...request, enterFrom: sheet.enterFrom, result: answer.value, units: sheet.units, title: "Traverse", width }) : planFigure({ ...plan, units: sheet.units, width, cautions: false }),
  );
  const faults = [planned, answer].find((one) => one.faults.length > 0)?.faults ?? [];
  return { request, answer: answer.value, holes: planned.value, figure: figure.value, faults };
}

function attempt<Value>(work: () => Value): { value: Value | null; faults: readonly InputFault[] } {
  try {
    return { value: work(), faults: [] };
  } catch (error) {
    if (error instanceof AirflowInputError) return { value: null, faults: error.faults };
    throw error;
  }
}

/** Lines of blanks as a plan has them, what was written before kept where it still has a place. */
export const fittedLines = (lines: string[][], holes: number[]): string[][] => holes.map((points, line) => Array.from({ length: points }, (_, point) => lines[line]?.[point] ?? ""));
