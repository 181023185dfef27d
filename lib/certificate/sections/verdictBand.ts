import type { DesignAnswer } from "@/lib/airflow/calculations/designAnswer";
import { ACTION_WASH, INK, MUTED, PAPER, RULE, WHITE } from "../colours";
import type { Block } from "../flow";
import { airflowDecimals, fixed, unitSymbol } from "../quantities";
import type { Sheet } from "../sheet";
import { FINE, leading } from "../styles";

interface Verdict {
  /** In the unit of the design's airflow. */
  measured: number;
  design: DesignAnswer;
  colour: string;
}

const BAND = 13;
/** Room that the measured figure's uncertainty has on either side of the band. */
const INSET = 4;

/** The tolerance as a band with the design in its middle, and on it the measured airflow with its uncertainty. */
export function verdictBand(sheet: Sheet, { measured, design, colour }: Verdict, width: number): Block {
  const target = design.airflow.value;
  const tolerance = (target * design.tolerancePercent) / 100;
  const expanded = design.expandedUncertainty.value;
  const reach = 1.12 * Math.max(1.5 * tolerance, Math.abs(measured - target) + expanded);
  const at = (value: number): number => INSET + ((value - target + reach) / (2 * reach)) * (width - 2 * INSET);
  const decimals = airflowDecimals(target);
  const written = (value: number): string => fixed(value, decimals);
  const alt = `Measured ${written(measured)} ± ${written(expanded)}, tolerance from ${written(target - tolerance)} to ${written(target + tolerance)}, design ${written(target)} ${unitSymbol(design.airflow.unit)}.`;
  return {
    height: BAND + leading(FINE) + 4,
    draw: (x, y) =>
      sheet.tagged(
        "Figure",
        () => {
          const top = y + 3;
          const { doc } = sheet;
          doc.rect(x, top, width, BAND).fillAndStroke(PAPER, RULE);
          doc.rect(x + at(target - tolerance), top, at(target + tolerance) - at(target - tolerance), BAND).fill(ACTION_WASH);
          doc.lineWidth(0.8).moveTo(x + at(target), top).lineTo(x + at(target), top + BAND).strokeColor(INK).stroke();
          drawMeasured(sheet, [measured - expanded, measured, measured + expanded].map((value) => x + at(value)) as [number, number, number], top + BAND / 2, colour);
          const base = top + BAND + FINE.size + 0.5;
          const edges = [target - tolerance, target, target + tolerance];
          // Figures that would touch are those of a narrow tolerance: the design's alone is written then.
          const roomy = at(target) - at(target - tolerance) > sheet.widthOf(written(target), FINE) + 6;
          for (const value of roomy ? edges : [target]) sheet.write(written(value), x + at(value), base, { ...FINE, colour: value === target ? INK : MUTED }, "middle");
        },
        { alt, bbox: [x, y, x + width, y + BAND + leading(FINE) + 4] },
      ),
  };
}

function drawMeasured({ doc }: Sheet, [low, middle, high]: [number, number, number], y: number, colour: string): void {
  doc.lineWidth(1.6).strokeColor(colour).moveTo(low, y).lineTo(high, y).stroke();
  for (const end of [low, high]) doc.moveTo(end, y - 3).lineTo(end, y + 3).stroke();
  doc.lineWidth(1).circle(middle, y, 3.2).fillAndStroke(colour, WHITE);
}
