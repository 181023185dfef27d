import { writeReadings } from "@/lib/airflow/figure/writeReadings";
import type { IssuedDocument } from "@/lib/records/issuedDocument";
import { INK, MUTED, RUST } from "../colours";
import { stacked, type Block, type Flow } from "../flow";
import type { Context } from "../options";
import { fixed, unitSymbol } from "../quantities";
import type { Style } from "../sheet";
import { LABEL } from "../styles";
import { row, rule, type Cell, type Column } from "../table";
import { heading, paragraph } from "../text";

const READING: Style = { face: "figuresStrong", size: 8, colour: INK };
const VELOCITY: Style = { face: "figures", size: 6.4, colour: MUTED };
const LABELS = 26;
const LEAST_COLUMN = 27;

/** The readings as a table in parts: holes down, points across, as many points in a part as fit. */
export interface ReadingTable {
  intro: Block[];
  parts: { head: Block; rows: Block[] }[];
  /** How much of the width the table takes. */
  width: number;
}

/** A reading as the table has it. */
interface Reading {
  words: string;
  velocity: string | null;
  suspected: boolean;
}

/**
 * The readings as written, and below each the velocity that it comes to. Holes stand below each other, points beside each
 * other, unless there are more holes than points.
 */
export function readingTable({ sheet, document }: Context, width: number): ReadingTable {
  const { readings } = document.measurement;
  const most = readings.lines.reduce((longest, line) => Math.max(longest, line.length), 0);
  const turned = readings.lines.length > most;
  const lines = readingsOf(document);
  const [down, across] = turned ? [most, lines.length] : [lines.length, most];
  const at = (row: number, column: number): Reading | undefined => (turned ? lines[column]?.[row] : lines[row]?.[column]);
  const widest = lines.flat().reduce((greatest, { words, velocity }) => Math.max(greatest, sheet.widthOf(words, READING), sheet.widthOf(velocity ?? "", VELOCITY)), 0);
  const step = Math.max(LEAST_COLUMN, widest + 7);
  const perPart = Math.max(1, Math.min(across, Math.floor((width - LABELS + 4) / step)));
  const columns: Column[] = [{ at: 0, width: LABELS }, ...Array.from({ length: perPart }, (_, index) => ({ at: LABELS + index * step, width: step - 4 }))];
  const parts = Array.from({ length: Math.ceil(across / perPart) }, (_, part) => {
    const numbers = Array.from({ length: Math.min(perPart, across - part * perPart) }, (_, index) => part * perPart + index);
    const head = row(sheet, columns, [{ words: turned ? "Point" : "Hole", style: LABEL, scope: "Column" }, ...numbers.map((number): Cell => ({ words: `${turned && number === numbers[0] ? "hole " : ""}${number + 1}`, style: LABEL, align: "right", scope: "Column" }))], 0.5);
    const rows = Array.from({ length: down }, (_, index) => ({ label: index + 1, cells: numbers.map((number) => at(index, number)) }))
      .filter(({ cells }) => cells.some((cell) => cell !== undefined))
      .map(({ label, cells }) => readingRow(sheet, columns, label, cells));
    return { head: stacked([head, rule(sheet, LABELS + numbers.length * step - 4)]), rows };
  });
  return { width: LABELS + perPart * step - 4, intro: [heading(sheet, "Readings as written", width), paragraph(sheet, introduction(document), LABEL, width)], parts };
}

function readingsOf({ measurement: { readings }, result: { points, checks } }: IssuedDocument): Reading[][] {
  const weight = (line: number, point: number): string => (readings.weights ? ` × ${readings.weights[line - 1]?.[point - 1]}` : "");
  const velocities = new Map(points.map(({ line, point, velocity }) => [`${line}/${point}`, `${fixed(velocity.value, velocity.unit === "m/s" ? 2 : 0)}${weight(line, point)}`]));
  const suspected = new Set(checks.filter(({ code, passed }) => code === "possible_slip" && !passed).flatMap(({ at }) => at ?? []).map(({ line, point }) => `${line}/${point}`));
  return writtenLines(readings.lines).map((line, l) =>
    line.map((words, p) => {
      const key = `${l + 1}/${p + 1}`;
      return { words, velocity: velocities.get(key) ?? null, suspected: suspected.has(key) };
    }),
  );
}

function introduction({ measurement: { readings }, result: { points, checks } }: IssuedDocument): string {
  const kind = readings.kind === "velocity_pressure" ? "Velocity pressure" : "Velocity";
  const slips = checks.some(({ code, passed }) => code === "possible_slip" && !passed) ? " Framed: looks like a slip." : "";
  return `${kind}, ${unitSymbol(readings.unit)}; below it the velocity, ${unitSymbol(points[0]?.velocity.unit ?? "")}${readings.weights ? ", × its weight" : ""}.${slips}`;
}

/** Each reading with as many decimals as the longest has, as on a sheet; one that this would round stays as it is. */
function writtenLines(lines: readonly (readonly (number | null)[])[]): string[][] {
  const written = writeReadings(lines.flat());
  let next = 0;
  return lines.map((line) =>
    line.map((reading) => {
      const words = written[next++] ?? "–";
      return (reading !== null && Number(words) !== reading ? String(reading) : words).replace("-", "−");
    }),
  );
}

/** A row of two lines: readings, and their velocities in small figures. */
function readingRow(sheet: Context["sheet"], columns: readonly Column[], label: number, cells: readonly (Reading | undefined)[]): Block {
  const height = READING.size * 1.02 + VELOCITY.size * 1.2 + 1.6;
  return {
    height,
    draw: (x, y) =>
      sheet.within("TR", () => {
        const base = y + READING.size + 0.4;
        sheet.tagged("TH", () => sheet.write(String(label), x, base, { ...READING, face: "strong" }), { scope: "Row" });
        cells.forEach((cell, index) => {
          const { at, width } = columns[index + 1]!;
          if (cell?.suspected) sheet.artifact(() => sheet.doc.roundedRect(x + at - 2, y - 0.4, width + 4, height - 1, 1.5).lineWidth(0.8).strokeColor(RUST).stroke());
          sheet.tagged("TD", () => {
            if (!cell) return;
            sheet.write(cell.words, x + at + width, base, { ...READING, colour: cell.suspected ? RUST : INK }, "right");
            if (cell.velocity !== null) sheet.write(cell.velocity, x + at + width, base + VELOCITY.size * 1.12, VELOCITY, "right");
          });
        });
      }),
  };
}

/** The whole table as one block, for where it is small. */
export function readingBlock({ sheet }: Context, { intro, parts }: ReadingTable): Block {
  const body = stacked(parts.map(({ head, rows }) => stacked([head, ...rows])), 4);
  return stacked([...intro, { height: body.height, draw: (x, y) => sheet.within("Table", () => body.draw(x, y), { title: "Readings" }) }]);
}

/** The table over as many pages as it takes; its head comes again on each. */
export function placeReadings({ sheet }: Context, flow: Flow, { intro, parts }: ReadingTable): void {
  const first = parts[0];
  flow.ensure(intro.reduce((sum, { height }) => sum + height, 0) + (first ? first.head.height + (first.rows[0]?.height ?? 0) : 0));
  intro.forEach((block) => flow.place(block));
  for (const { head, rows } of parts) {
    sheet.within("Table", () => {
      rows.forEach((one, index) => {
        if (flow.ensure(one.height + (index === 0 ? head.height : 0)) || index === 0) flow.place(head);
        flow.place(one);
      });
    }, { title: "Readings" });
    flow.gap(6);
  }
}
