import type { Block, Flow } from "./flow";
import type { Sheet, Style } from "./sheet";
import { ascent, BODY, HEADING, leading } from "./styles";
import { wrap } from "./type/wrap";

/** A paragraph that stands on one page. */
export function paragraph(sheet: Sheet, words: string, style: Style, width: number, tag = "P"): Block {
  const lines = wrap(sheet, words, style, width);
  return {
    height: lines.length * leading(style),
    draw: (x, y) => sheet.tagged(tag, () => lines.forEach((line, index) => sheet.write(line, x, y + ascent(style) + index * leading(style), style))),
  };
}

/** A paragraph over as many pages as it takes, so far in from the left. */
export function flowing(sheet: Sheet, flow: Flow, words: string, style: Style, indent: number): void {
  sheet.within("P", () => {
    for (const line of wrap(sheet, words, style, sheet.width - indent)) {
      const y = flow.take(leading(style));
      sheet.content(() => sheet.write(line, sheet.left + indent, y + ascent(style), style));
    }
  });
}

/** The heading of a section. */
export function heading(sheet: Sheet, words: string, width: number): Block {
  const block = paragraph(sheet, words, HEADING, width, "H2");
  return { height: block.height + 1, draw: block.draw };
}

/** How far in the text of a section stands whose heading stands beside it. */
export const INDENT = 46;

/** A heading beside the text that comes next, of which this much must stand on the same page. */
export function sideHeading(sheet: Sheet, flow: Flow, words: string, following: number): void {
  const block = paragraph(sheet, words, HEADING, INDENT, "H2");
  flow.ensure(Math.max(block.height, following));
  block.draw(sheet.left, flow.top - (HEADING.size - BODY.size));
}
