import { MUTED, RULE } from "./colours";
import { stacked, type Block } from "./flow";
import type { Sheet, Style } from "./sheet";
import { ascent, BODY, LABEL, leading } from "./styles";
import { wrap } from "./type/wrap";

export interface Cell {
  words: string;
  style?: Style;
  align?: "left" | "right" | "middle";
  /** A header of its row or its column. */
  scope?: "Row" | "Column";
}

export interface Column {
  at: number;
  width: number;
}

/** A row as high as its highest cell; words wrap in their column. */
export function row(sheet: Sheet, columns: readonly Column[], cells: readonly Cell[], padding = 0.8): Block {
  const laid = cells.map(({ words, style = BODY, align = "left", scope }, index) => {
    const { at, width } = columns[index]!;
    const lines = wrap(sheet, words, style, width);
    return { lines, style, align, scope, at: at + (align === "right" ? width : align === "middle" ? width / 2 : 0) };
  });
  const height = Math.max(0, ...laid.map(({ lines, style }) => lines.length * leading(style))) + 2 * padding;
  const base = Math.max(0, ...laid.map(({ style }) => ascent(style))) + padding;
  return {
    height,
    draw: (x, y) =>
      sheet.within("TR", () => {
        for (const { lines, style, align, scope, at } of laid) {
          const write = (): void => lines.forEach((line, index) => sheet.write(line, x + at, y + base + index * leading(style), style, align));
          sheet.tagged(scope ? "TH" : "TD", write, scope && { scope });
        }
      }),
  };
}

/** A thin line under what stands above it. */
export const rule = (sheet: Sheet, width: number, colour = RULE): Block => ({
  height: 0,
  draw: (x, y) => sheet.artifact(() => sheet.doc.moveTo(x, y).lineTo(x + width, y).lineWidth(0.5).strokeColor(colour).stroke()),
});

export type Fact = readonly [label: string, value: string];

const LABEL_SHARE = 0.31;

/** Facts as rows of a label and a value. */
export function factRows(sheet: Sheet, facts: readonly Fact[], width: number): Block[] {
  const split = Math.min(width * LABEL_SHARE, 90);
  const columns = [{ at: 0, width: split - 4 }, { at: split, width: width - split }];
  return facts.map(([label, value]) => row(sheet, columns, [{ words: label, style: { ...LABEL, colour: MUTED }, scope: "Row" }, { words: value }], 0.25));
}

/** Rows that stay together, as one table. */
export function table(sheet: Sheet, rows: readonly Block[], title: string): Block {
  const all = stacked(rows);
  return { height: all.height, draw: (x, y) => sheet.within("Table", () => all.draw(x, y), { title }) };
}
