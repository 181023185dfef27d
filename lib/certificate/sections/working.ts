import { INK, MUTED } from "../colours";
import { beside, stacked, type Block, type Flow } from "../flow";
import type { Context } from "../options";
import { quantity } from "../quantities";
import type { Sheet, Style } from "../sheet";
import { ascent, leading } from "../styles";
import { heading } from "../text";
import { wrap } from "../type/wrap";
import { condense, type CondensedStep } from "./condense";

const EQUATION: Style = { face: "text", size: 6.9, colour: INK, formula: true };
const NAME: Style = { face: "text", size: 6.9, colour: MUTED };
const GUTTER = 14;
/** Digits that let a reader redo the arithmetic and meet the figures of the certificate. */
const DIGITS = 6;

/** The working in two columns: for each step its equation, its value, and what it takes that no step before it gave. */
export function placeWorking({ sheet, document }: Context, flow: Flow): void {
  const steps = condense(document.result.working ?? [], document.result.uncertainty.budget);
  if (steps.length === 0) return;
  const width = (sheet.width - GUTTER) / 2;
  const blocks = steps.map((step) => stepBlock(sheet, step, width));
  const title = heading(sheet, "Working", sheet.width);
  flow.ensure(title.height + 40);
  flow.place(title);
  let rest = blocks;
  while (rest.length > 0) {
    const half = split(rest, flow.remaining);
    if (half.left.length === 0) {
      flow.ensure(flow.remaining + 1);
      continue;
    }
    flow.place(beside([{ at: 0, block: stacked(half.left) }, { at: width + GUTTER, block: stacked(half.right) }]));
    rest = half.rest;
  }
}

function stepBlock(sheet: Sheet, { step, equation, value, given }: CondensedStep, width: number): Block {
  const name = `${step}: `;
  const result = value ? `${equation} = ${quantity(value, DIGITS)}` : step.startsWith("Velocity") ? `${equation}, values below the readings` : `${equation}, from the readings`;
  const inputs = given.map(([symbol, input]) => `${symbol} ${quantity(input, DIGITS)}`).join(", ");
  const lines = wrap(sheet, `${name}${result}${inputs ? `; ${inputs}` : ""}`, EQUATION, width);
  return {
    height: lines.length * leading(EQUATION) + 0.3,
    draw: (x, y) =>
      sheet.tagged("P", () =>
        lines.forEach((line, index) => {
          const base = y + ascent(EQUATION) + index * leading(EQUATION);
          const named = index === 0 && line.startsWith(name);
          if (named) sheet.write(name, x, base, NAME);
          sheet.write(named ? line.slice(name.length) : line, named ? x + sheet.widthOf(name, NAME) : x, base, EQUATION);
        }),
      ),
  };
}

const heightOf = (blocks: readonly Block[]): number => blocks.reduce((sum, { height }) => sum + height, 0);

/** As many blocks as two columns of a height hold, the left one filled so that both come out about as long. */
function split(blocks: readonly Block[], room: number): { left: Block[]; right: Block[]; rest: Block[] } {
  let count = blocks.length;
  for (;;) {
    const taken = blocks.slice(0, count);
    const half = heightOf(taken) / 2;
    let left = 0;
    while (left < count && heightOf(taken.slice(0, left)) < half) left += 1;
    const columns = [taken.slice(0, left), taken.slice(left)] as const;
    if (count === 0 || columns.every((column) => heightOf(column) <= room)) return { left: columns[0], right: columns[1], rest: blocks.slice(count) };
    count -= 1;
  }
}
