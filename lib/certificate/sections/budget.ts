import type { InfluenceName } from "@/lib/airflow/uncertainty/budget";
import { ACTION, MUTED } from "../colours";
import { beside, stacked, type Block } from "../flow";
import type { Context } from "../options";
import { fixed } from "../quantities";
import { BODY, FINE, LABEL, STRONG } from "../styles";
import { row, rule, table, type Column } from "../table";
import { heading } from "../text";

const NAMES: Record<InfluenceName, string> = {
  instrument: "Instrument", fluctuation: "Fluctuation", layout: "Layout and count", site: "Site", area: "Area", density: "Density", rounding: "Rounding",
};
const BAR = 22;

/** The uncertainty budget: each influence, how much, from where, and as a bar. */
export function budget({ sheet, document }: Context, width: number): Block {
  const { budget: influences, combinedPercent, expandedPercent, coverageFactor } = document.result.uncertainty;
  const columns: Column[] = [{ at: 0, width: 62 }, { at: 60, width: 24 }, { at: 92 + BAR, width: 26 }, { at: 118 + BAR, width: width - 118 - BAR }];
  const greatest = influences.reduce((most, { percent }) => Math.max(most, percent), 0);
  const head = row(sheet, columns, ["Influence", "u, %", "Origin", "What it rests on"].map((words, index) => ({ words, style: LABEL, align: index === 1 ? ("right" as const) : undefined, scope: "Column" as const })), 0.4);
  const rows = influences.map(({ name, percent, origin, detail }) => {
    const cells = row(sheet, columns, [{ words: NAMES[name], scope: "Row" }, { words: fixed(percent, 3), style: { ...BODY, face: "figures", size: 7 }, align: "right" }, { words: origin, style: { ...FINE, colour: MUTED } }, { words: detailWords(detail), style: FINE }], 0.2);
    const bar: Block = { height: cells.height, draw: (x, y) => sheet.artifact(() => sheet.doc.rect(x, y + 2.4, Math.max(0.4, greatest > 0 ? (BAR * percent) / greatest : 0), 4.6).fill(ACTION)) };
    return beside([{ at: 0, block: cells }, { at: 86, block: bar }]);
  });
  const combined = row(sheet, [columns[0]!, columns[1]!, { at: 90, width: width - 90 }], [
    { words: "Combined", style: STRONG, scope: "Row" },
    { words: fixed(combinedPercent, 3), style: { ...BODY, face: "figuresStrong", size: 7 }, align: "right" },
    { words: `in quadrature; expanded ${fixed(expandedPercent, 2)} %, k = ${coverageFactor}. Defaults are engineering judgement.`, style: FINE },
  ], 0.6);
  return stacked([heading(sheet, "Uncertainty budget", width), table(sheet, [head, rule(sheet, width), ...rows, rule(sheet, width), combined], "Uncertainty budget")]);
}

/** Units and layouts in a row's detail as the trade writes them. */
const detailWords = (detail: string): string => detail.replace(/in_wg/g, "in. w.g.").replace(/log_tchebycheff/g, "log-Tchebycheff").replace(/log_linear/g, "log-linear").replace(/equal_area/g, "equal area").replace(/method_1/g, "Method 1");
