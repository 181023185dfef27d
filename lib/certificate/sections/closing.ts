import { CAUTIONS } from "@/lib/airflow/layout/cautions";
import type { Flow } from "../flow";
import type { Context } from "../options";
import { BODY, FINE, leading } from "../styles";
import { flowing, INDENT, sideHeading } from "../text";

/** The technician's notes, as they were written. */
export function placeNotes({ sheet, document: { notes } }: Context, flow: Flow): void {
  if (!notes) return;
  sideHeading(sheet, flow, "Notes", leading(BODY));
  flowing(sheet, flow, notes, BODY, INDENT);
}

export function placeCautions({ sheet }: Context, flow: Flow): void {
  sideHeading(sheet, flow, "Cautions", 3 * leading(FINE));
  flowing(sheet, flow, CAUTIONS.join(" "), FINE, INDENT);
}
