import type { AirflowAnswer, AirflowInput } from "@/lib/airflow/calculations/airflow";
import { AirflowInputError } from "@/lib/airflow/errors";
import { resultFigure } from "@/lib/airflow/figure/resultFigure";
import { Figure } from "../figures/Figure";

/** The sheet's duct with what was read in it and what the API made of it. */
export function SheetFigure({ request, answer }: { request: AirflowInput | null; answer: AirflowAnswer | null }) {
  const svg = request && drawn(request, answer);
  return svg === null ? <p className="text-small text-muted">These dimensions and this lining leave no duct to draw.</p> : <Figure svg={svg} />;
}

function drawn(request: AirflowInput, answer: AirflowAnswer | null): string | null {
  try {
    return resultFigure({ ...request, result: answer ?? undefined, title: "Supply main", width: 400 });
  } catch (error) {
    if (error instanceof AirflowInputError) return null;
    throw error;
  }
}
