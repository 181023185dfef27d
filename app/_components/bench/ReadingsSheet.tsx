"use client";

import { useRef, type ClipboardEvent, type KeyboardEvent } from "react";
import { cellsOf, numberIn } from "./benchSheet";

interface ReadingsSheetProps {
  /** A line for each hole, a text for each point; all lines as long as their plan has points. */
  lines: string[][];
  unit: string;
  onChange: (lines: string[][]) => void;
  /** Points that a check suspects, as `line/point` counted from 1. */
  suspected: ReadonlySet<string>;
}

/** The readings as a spreadsheet: a column for each hole, a row for each point. Arrows and Enter move, a pasted block fills. */
export function ReadingsSheet({ lines, unit, onChange, suspected }: ReadingsSheetProps) {
  const table = useRef<HTMLTableElement>(null);
  const rows = Math.max(...lines.map((line) => line.length));

  const focus = (line: number, point: number): void => {
    const cell = table.current?.querySelector<HTMLInputElement>(`[data-cell="${line}/${point}"]`);
    cell?.focus();
    cell?.select();
  };
  const set = (changes: { line: number; point: number; text: string }[]): void => {
    const next = lines.map((line) => [...line]);
    for (const { line, point, text } of changes) if (next[line]?.[point] !== undefined) next[line][point] = text;
    onChange(next);
  };
  const move = (event: KeyboardEvent<HTMLInputElement>, line: number, point: number): void => {
    const { key, currentTarget: { selectionStart, selectionEnd, value } } = event;
    const atStart = selectionStart === 0 && selectionEnd === 0;
    const atEnd = selectionStart === value.length;
    const whole = selectionStart === 0 && selectionEnd === value.length;
    const [dLine, dPoint] =
      key === "ArrowUp" ? [0, -1]
      : key === "ArrowDown" ? [0, 1]
      : key === "Enter" ? (event.shiftKey ? [0, -1] : [0, 1])
      : key === "ArrowLeft" && (atStart || whole) ? [-1, 0]
      : key === "ArrowRight" && (atEnd || whole) ? [1, 0]
      : [0, 0];
    if (dLine === 0 && dPoint === 0) return;
    event.preventDefault();
    // Enter at the foot of a column goes on at the head of the next.
    if (key === "Enter" && !event.shiftKey && lines[line]![point + 1] === undefined) focus(line + 1, 0);
    else focus(line + dLine, point + dPoint);
  };
  const paste = (event: ClipboardEvent<HTMLInputElement>, line: number, point: number): void => {
    const cells = cellsOf(event.clipboardData.getData("text/plain"));
    if (cells.length === 1 && cells[0]!.length === 1) return;
    event.preventDefault();
    // A single column that is longer than the hole's runs on into the next holes, as it was read.
    const isColumn = cells.every((row) => row.length === 1) && cells.length > lines[line]!.length - point;
    set(isColumn ? runOn(cells.map(([text]) => text!), lines, line, point) : cells.flatMap((row, r) => row.map((text, c) => ({ line: line + c, point: point + r, text }))));
  };

  return (
    <>
      <p className="pb-2 text-small">
        Readings, {unit} <span className="text-muted">A blank left empty is a point that could not be read. Paste a column or a block.</span>
      </p>
      <div className="overflow-x-auto">
        <table ref={table} className="border-collapse font-mono text-small">
          <caption className="sr-only">Readings, {unit}</caption>
          <thead>
            <tr className="border-t-2 border-b border-t-ink border-b-ink">
              <th scope="col" className="px-2 py-1 text-left font-sans text-fine font-normal text-muted">Point</th>
              {lines.map((_, line) => (
                <th key={line} scope="col" className="px-1 py-1 text-center font-sans text-fine font-normal text-muted">Hole {line + 1}</th>
              ))}
            </tr>
          </thead>
          <tbody>
            {Array.from({ length: rows }, (_, point) => (
              <tr key={point} className="border-b">
                <th scope="row" className="px-2 text-left font-normal text-muted">{point + 1}</th>
                {lines.map((line, index) => (
                  <td key={index} className="border-l p-0">
                    {line[point] !== undefined && (
                      <input
                        data-cell={`${index}/${point}`}
                        aria-label={`Hole ${index + 1}, point ${point + 1}`}
                        inputMode="decimal"
                        autoComplete="off"
                        value={line[point]}
                        onChange={(event) => set([{ line: index, point, text: event.target.value }])}
                        onKeyDown={(event) => move(event, index, point)}
                        onPaste={(event) => paste(event, index, point)}
                        onFocus={(event) => event.target.select()}
                        aria-invalid={Number.isNaN(numberIn(line[point]!)) || undefined}
                        className={`block h-9 w-20 min-w-0 bg-transparent px-1 text-center -outline-offset-2 focus:bg-action-wash aria-[invalid=true]:text-rust aria-[invalid=true]:underline ${suspected.has(`${index + 1}/${point + 1}`) ? "font-semibold text-rust ring-2 ring-rust ring-inset" : ""}`}
                      />
                    )}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </>
  );
}

function runOn(texts: string[], lines: string[][], line: number, point: number): { line: number; point: number; text: string }[] {
  const changes: { line: number; point: number; text: string }[] = [];
  let [l, p] = [line, point];
  for (const text of texts) {
    if (lines[l] === undefined) break;
    changes.push({ line: l, point: p, text });
    p += 1;
    if (p >= lines[l]!.length) [l, p] = [l + 1, 0];
  }
  return changes;
}
