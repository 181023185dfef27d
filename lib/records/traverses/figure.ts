import { planFigure } from "@/lib/airflow/figure/planFigure";
import { resultFigure } from "@/lib/airflow/figure/resultFigure";
import { thumbnail } from "@/lib/airflow/figure/thumbnail";
import { refusal } from "@/lib/problems/problem";
import { measurementOf } from "./measure";
import type { TraverseRow } from "./row";

/** The drawing of a stored traverse: its readings, or, while there are none, its plan. Throws the problem where there is nothing to draw. */
export function figureOf(row: TraverseRow, size: "page" | "thumbnail" = "page", width?: number): string {
  const { input, instrument_snapshot, result } = row;
  const measurement = measurementOf(input, instrument_snapshot);
  if (measurement) {
    const drawn = { ...measurement, result: result ?? undefined };
    return size === "thumbnail" ? thumbnail(drawn) : resultFigure({ ...drawn, title: titleOf(row), width });
  }
  const { duct, layout, points, enterFrom, probe, site, units } = input;
  if (duct && layout && size === "page") return planFigure({ duct, layout, points, enterFrom, probe, site, units, title: titleOf(row), width });
  throw refusal("nothing-to-draw", "The traverse has neither readings nor a layout to draw in its duct.");
}

const titleOf = ({ system, input: { location } }: TraverseRow): string => [system, location].filter(Boolean).join(", ") || "Traverse";
