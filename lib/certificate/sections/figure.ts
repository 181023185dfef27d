import { resultFigure } from "@/lib/airflow/figure/resultFigure";
import type { Block } from "../flow";
import type { Context } from "../options";
import { drawSvg } from "../svg/drawSvg";
import { parseSvg } from "../svg/parseSvg";

/** Units of the drawing across; fewer make its letters larger on the page. */
const DRAWN = 320;

/** The cross-section with its readings, as vectors. */
export function figure({ sheet, document, system }: Context, width: number, highest: number): Block {
  const { measurement, result } = document;
  const svg = parseSvg(resultFigure({ ...measurement, result, units: system, title: "Cross-section", width: DRAWN }));
  const [w, h] = [Number(svg.attributes.width), Number(svg.attributes.height)];
  const scale = Math.min(width / w, highest / h);
  const alt = svg.children.filter(({ name }) => name === "title" || name === "desc").map(({ words }) => words).join(". ");
  return {
    height: h * scale,
    draw: (x, y) =>
      sheet.tagged(
        "Figure",
        () => {
          sheet.doc.save().translate(x + (width - w * scale) / 2, y).scale(scale);
          drawSvg(sheet, svg);
          sheet.doc.restore();
        },
        { alt, bbox: [x, y, x + width, y + h * scale] },
      ),
  };
}
