import { writeReadings } from "@/lib/airflow/figure/writeReadings";
import { INK, MUTED, RUST } from "../colours";
import { beside, stacked, type Block, type Flow } from "../flow";
import type { Context } from "../options";
import { fixed, unitSymbol } from "../quantities";
import type { Style } from "../sheet";
import { LABEL } from "../styles";
import { row, rule, type Cell, type Column } from "../table";
import { heading, paragraph } from "../text";

const READING: Style = { face: "figuresStrong", size: 8, colour: INK };
const VELOCITY: Style = { face: "figures", size: 6.4, colour: MUTED };
const HOLE = 26;
const LEAST_COLUMN = 27;
/** Between the table and what stands to its right. */
export const RIGHT_GAP = 18;

/** The readings as a table in parts: holes down, points across, as many points in a part as fit. */
export interface ReadingTable {
  intro: Block[];
  parts: { head: Block; rows: Block[] }[];
  /** How much of the width the table takes. */
  width: number;
}

/** The readings as written, and below each the velocity that it comes to. */
export function readingTable({ sheet, document }: Context, width: number): ReadingTable {
  const { readings } = document.measurement;
  const { points, checks } = document.result;
  const velocities = new Map(points.map(({ line, point, velocity }) => [`${line}/${point}`, velocity.value]));
  const suspected = new Set(checks.filter(({ code, passed }) => code === "possible_slip" && !passed).flatMap(({ at }) => at ?? []).map(({ line, point }) => `${line}/${point}`));
  const written = writtenLines(readings.lines);
  const decimals = (points[0]?.velocity.unit ?? "") === "m/s" ? 2 : 0;
  const widest = written.flat().reduce((most, words) => Math.max(most, sheet.widthOf(words, READING)), 0);
  const step = Math.max(LEAST_COLUMN, widest + 7);
  const most = readings.lines.reduce((longest, line) => Math.max(longest, line.length), 0);
  const perPart = Math.max(1, Math.min(most, Math.floor((width - HOLE) / step)));
  const columns: Column[] = [{ at: 0, width: HOLE }, ...Array.from({ length: perPart }, (_, index) => ({ at: HOLE + index * step, width: step - 4 }))];
  const parts = Array.from({ length: Math.ceil(most / perPart) }, (_, part) => {
    const numbers = Array.from({ length: Math.min(perPart, most - part * perPart) }, (_, index) => part * perPart + index + 1);
    const head = row(sheet, columns, [{ words: "Hole", style: LABEL, scope: "Column" }, ...numbers.map((number): Cell => ({ words: String(number), style: LABEL, align: "right", scope: "Column" }))]);
    const rows = written.flatMap((line, l) => {
      if (part > 0 && line.length < numbers[0]!) return [];
      const cells = numbers.map((number): Cell => {
        const key = `${l + 1}/${number}`;
        const words = line[number - 1];
        if (words === undefined) return { words: "" };
        const velocity = velocities.get(key);
        return { words: velocity === undefined ? words : `${words}\n${fixed(velocity, decimals)}`, style: { ...READING, colour: suspected.has(key) ? RUST : INK }, align: "right" };
      });
      return [readingRow(sheet, columns, l + 1, cells)];
    });
    return { head: stacked([head, rule(sheet, HOLE + numbers.length * step - 4)]), rows };
  });
  const unit = readings.kind === "velocity_pressure" ? `Velocity pressure in ${unitSymbol(readings.unit)}` : `Velocity in ${unitSymbol(readings.unit)}`;
  const under = points[0] ? `; below each the velocity in ${unitSymbol(points[0].velocity.unit)} that counts` : "";
  const slips = suspected.size > 0 ? " A reading in rust looks like a slip." : "";
  return { width: HOLE + perPart * step - 4, intro: [heading(sheet, "Readings as written", width), paragraph(sheet, `${unit}, points from the hole inwards${under}.${slips}`, LABEL, width)], parts };
}

/** Each reading with as many decimals as the longest has, as on a sheet. */
function writtenLines(lines: readonly (readonly (number | null)[])[]): string[][] {
  const written = writeReadings(lines.flat());
  let next = 0;
  return lines.map((line) => line.map(() => (written[next++] ?? "–").replace("-", "−")));
}

/** A row of two lines: readings, and their velocities in small figures. */
function readingRow(sheet: Context["sheet"], columns: readonly Column[], hole: number, cells: readonly Cell[]): Block {
  const height = READING.size * 1.02 + VELOCITY.size * 1.2 + 1.6;
  return {
    height,
    draw: (x, y) =>
      sheet.within("TR", () => {
        const base = y + READING.size + 0.4;
        sheet.tagged("TH", () => sheet.write(String(hole), x, base, { ...READING, face: "strong" }), { scope: "Row" });
        cells.forEach(({ words, style = READING }, index) => {
          const { at, width } = columns[index + 1]!;
          const [reading = "", velocity] = words.split("\n");
          sheet.tagged("TD", () => {
            sheet.write(reading, x + at + width, base, style, "right");
            if (velocity) sheet.write(velocity, x + at + width, base + VELOCITY.size * 1.12, VELOCITY, "right");
          });
        });
      }),
  };
}

/** The whole table as one block, for where it is small; where there is room to its right, something stands there. */
export function readingBlock({ sheet }: Context, { intro, parts, width }: ReadingTable, right: Block | null): Block {
  const body = stacked(parts.map(({ head, rows }) => stacked([head, ...rows])), 4);
  const tabled = { height: body.height, draw: (x: number, y: number) => sheet.within("Table", () => body.draw(x, y), { title: "Readings" }) };
  return stacked([...intro, beside([{ at: 0, block: tabled }, ...(right ? [{ at: width + RIGHT_GAP, block: right }] : [])])], 1);
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
