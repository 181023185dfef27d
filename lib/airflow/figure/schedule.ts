import type { TraverseLine } from "../layout/line";
import type { TraversePlan } from "../layout/plan";
import type { UnitSystem } from "../units/units";
import { note, stack, type Block } from "./blocks";
import { tape, tapeUnit } from "./measures";
import { CARD, EDGE, element, INK, MUTED, SANS, strokes, text } from "./svg";

/** Holes that are read at the same depths, and so share a heading. */
interface Group {
  first: TraverseLine;
  holes: { line: TraverseLine; number: number }[];
}

const ROW = 24;
const HEAD_ROW = 16;
const LEAST_COLUMN = 46;
const MOST_COLUMN = 74;
const LABEL = 92;

/** Where each mark goes on the probe, and a blank box for each reading. */
export function schedule({ lines, wall }: TraversePlan, system: UnitSystem, width: number): Block {
  return stack(groupsOf(lines).map((group) => groupTable(group, wall > 0, system, width)), 14);
}

function groupsOf(lines: readonly TraverseLine[]): Group[] {
  const groups = new Map<string, Group>();
  for (const [index, line] of lines.entries()) {
    const key = [line.edge === "middle_of_end", line.wall, ...line.points.map(({ depth }) => depth)].map((value) => (typeof value === "number" ? value.toFixed(6) : value)).join(" ");
    const group = groups.get(key) ?? { first: line, holes: [] };
    group.holes.push({ line, number: index + 1 });
    groups.set(key, group);
  }
  return [...groups.values()];
}

/** A table for a group; points that do not fit in a row go on in another. */
function groupTable({ first, holes }: Group, walled: boolean, system: UnitSystem, width: number): Block {
  const most = Math.max(1, Math.floor((width - LABEL) / LEAST_COLUMN));
  const rows = Math.ceil(first.points.length / most);
  const perRow = Math.ceil(first.points.length / rows);
  const column = Math.min(MOST_COLUMN, (width - LABEL) / perRow);
  const name: Block = { svg: text(headingOf(holes), { y: 11, "font-family": SANS, "font-size": 12, "font-weight": 600 }), height: 12 };
  const heading = stack([name, note(placesOf(holes), width, 11)], 2);
  const banks = Array.from({ length: rows }, (_, bank) => tableOf(first, holes, bank * perRow, Math.min(perRow, first.points.length - bank * perRow), column, walled, system));
  return stack([heading, ...banks], 6);
}

function headingOf(holes: Group["holes"]): string {
  const numbers = holes.map(({ number }) => number);
  const [first, last] = [numbers[0]!, numbers.at(-1)!];
  const consecutive = last - first === numbers.length - 1;
  if (numbers.length === 1) return `Hole ${first}`;
  return consecutive ? `Holes ${first} to ${last}` : `Holes ${numbers.join(", ")}`;
}

/** What the places beside the holes' numbers are. */
function placesOf(holes: Group["holes"]): string {
  const edges = new Set(holes.map(({ line }) => line.edge));
  if (edges.has("middle_of_end")) return "places up or down from the middle of the end, round the outside";
  const { face, edge } = holes[0]!.line;
  if (edge === "left" || edge === "top") return `${face} face, places from its ${edge} edge, on the outside`;
  return `places round the outside from hole 1, clockwise${edges.has("hole_1_anticlockwise") ? "; − is anticlockwise" : ""}`;
}

function placeOf({ edge, alongOutside, angle }: TraverseLine, number: number, system: UnitSystem): string {
  const place = tape(alongOutside, system);
  if (edge === "middle_of_end") return `${angle! < 90 || angle! > 270 ? "up" : "down"} ${place}`;
  if (edge === "hole_1_anticlockwise") return `at −${place}`;
  return edge === "hole_1_clockwise" && number === 1 ? "" : `at ${place}`;
}

function tableOf(first: TraverseLine, holes: Group["holes"], from: number, count: number, column: number, walled: boolean, system: UnitSystem): Block {
  const points = first.points.slice(from, from + count);
  const centre = (index: number): number => LABEL + (index + 0.5) * column;
  const unit = tapeUnit(system);
  const headRows: { label: string; cells: string[]; strong?: boolean }[] = [
    { label: "point", cells: points.map(({ standsFor }, index) => `${from + index + 1}${standsFor > 1 ? ` ×${standsFor}` : ""}`) },
    ...(walled ? [{ label: `inside, ${unit}`, cells: points.map(({ depth }) => tape(depth, system)) }] : []),
    { label: `mark, ${unit}`, cells: points.map(({ depth }) => tape(first.wall + depth, system)), strong: true },
  ];
  const head = headRows.map(({ label, cells, strong }, row) => {
    const y = row * HEAD_ROW + 12;
    const style = strong ? { "font-weight": 600 } : { fill: MUTED };
    return text(label, { x: 0, y, fill: MUTED }) + cells.map((cell, index) => text(cell, { x: centre(index), y, "text-anchor": "middle", ...style })).join("");
  });
  const top = headRows.length * HEAD_ROW + 4;
  const body = holes.map(({ line, number }, row) => holeRow(placeOf(line, number, system), number, top + row * ROW, points.length, column));
  const height = top + holes.length * ROW;
  return { svg: head.join("") + strokes([[[0, top], [LABEL + points.length * column, top]]], { stroke: INK }) + body.join(""), height };
}

function holeRow(place: string, number: number, y: number, count: number, column: number): string {
  const boxes = Array.from({ length: count }, (_, index) => element("rect", { x: LABEL + index * column + 2, y: y + 3, width: column - 4, height: ROW - 5, fill: CARD, stroke: EDGE, "stroke-width": 0.75 }));
  return text(String(number), { x: 0, y: y + 16, "font-weight": 600 }) + text(place, { x: LABEL - 8, y: y + 16, "text-anchor": "end", fill: MUTED }) + boxes.join("");
}
